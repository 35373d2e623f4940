/** What stands while the first page is fetched: the ground and nothing that jumps. */
export function Loading() {
  return (
    <div role="status" className="grid min-h-dvh place-items-center text-soft">
      <span className="sr-only">Loading</span>
    </div>
  )
}
