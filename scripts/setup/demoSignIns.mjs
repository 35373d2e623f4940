/** The demo sign-ins, one a line, as the server at `address` tells its sign-in page; none out of demo mode. */
export async function demoSignInLines(address) {
  const answer = await fetch(new URL('/api/v1/info', address))
  const { demoSignIns } = await answer.json()
  return demoSignIns.map(({ role, email, password }) => `  ${role.padEnd(8)}${email.padEnd(28)}${password}`)
}
