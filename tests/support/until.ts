/** Waits until `holds`, looking every few milliseconds; rejects when it never does. */
export async function until(holds: () => boolean | Promise<boolean>, patienceMs = 15_000): Promise<void> {
  const end = Date.now() + patienceMs
  while (!(await holds())) {
    if (Date.now() > end) throw new Error(`after ${patienceMs} ms this did not hold: ${holds.toString()}`)
    await new Promise((resolve) => setTimeout(resolve, 20))
  }
}
