/** Text in a fixed pitch that may be wider or longer than its place: it scrolls, with the keyboard too. */
export function CodeBlock({ label, children }: { label: string; children: string }) {
  return (
    // What scrolls must be reachable by keyboard (WCAG 2.1.1), though it is no control.
    // eslint-disable-next-line jsx-a11y/no-noninteractive-tabindex
    <section aria-label={label} tabIndex={0} className="max-h-96 overflow-auto rounded bg-sunk p-3">
      <pre className="font-mono text-caption">{children}</pre>
    </section>
  )
}
