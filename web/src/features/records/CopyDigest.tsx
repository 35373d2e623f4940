import { useCopy } from '../../components/ui/useCopy.ts'

const SHOWN = 12

/** A digest, its beginning shown, the whole of it copied when pressed. */
export function CopyDigest({ digest }: { digest: string }) {
  const [state, copy] = useCopy()
  const beginning = digest.slice(0, SHOWN)
  return (
    <span className="inline-flex max-w-full flex-wrap items-baseline gap-x-2">
      <code className="font-mono text-caption break-all" title={digest}>
        {state === 'refused' ? digest : beginning}
      </code>
      <button
        type="button"
        className="link text-caption"
        aria-label={`Copy the whole digest ${beginning}`}
        onClick={() => void copy(digest)}
      >
        copy
      </button>
      <span role="status" className="text-caption text-soft">
        {state === 'copied' ? 'copied' : ''}
        {state === 'refused' ? 'The browser does not let this page copy: select it instead.' : ''}
      </span>
    </span>
  )
}
