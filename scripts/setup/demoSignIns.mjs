/** The demo sign-ins, one a line, as the server at `address` tells its sign-in page; none out of demo mode. */
export async function demoSignInLines(address) {
  const answer = await fetch(new URL('/api/v1/info', address))
  const { demoSignIns } = await answer.json()
  return demoSignIns.map(({ role, email, password }) => `  ${role.padEnd(8)}${email.padEnd(28)}${password}`)
}

/** Where mails are read when no mail server is set: the server then keeps them itself, in demo mode. */
export const mailPageLines = ({ address, demo, environment }) =>
  demo && !environment.EMBERLINE_SMTP_URL ? [`Mails it sends are read at ${new URL('/mail', address)}`] : []
