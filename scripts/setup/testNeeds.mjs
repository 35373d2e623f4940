const PURE = ['core', 'reference', 'web']
const WITHOUT_BROWSER = [...PURE, 'api', 'db', 'scripts']

const isUnder = (folders) => (filter) =>
  folders.some((folder) => new RegExp(`^(\\./)?tests/${folder}(/|$)`).test(filter))

/** What the tests chosen by path filters need; without filters, everything. */
export function needsOf(filters) {
  const all = filters.length === 0
  return {
    cluster: all || !filters.every(isUnder(PURE)),
    browser: all || !filters.every(isUnder(WITHOUT_BROWSER)),
  }
}
