const FORMAT = new Intl.DateTimeFormat(undefined, { dateStyle: 'medium', timeStyle: 'short' })

/** A moment in the reader's own time and manner; the title tells it in UTC. */
export function Moment({ at }: { at: string }) {
  return (
    <time dateTime={at} title={at}>
      {FORMAT.format(new Date(at))}
    </time>
  )
}
