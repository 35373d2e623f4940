import { useState } from 'react'

/** A digest, its beginning shown, the whole of it copied when pressed. */
export function CopyDigest({ digest }: { digest: string }) {
  const [copied, setCopied] = useState(false)
  const copy = async (): Promise<void> => {
    await navigator.clipboard.writeText(digest)
    setCopied(true)
  }
  return (
    <span className="inline-flex items-baseline gap-2">
      <code className="font-mono text-caption" title={digest}>
        {digest.slice(0, 12)}
      </code>
      <button
        type="button"
        className="link text-caption"
        aria-label={`Copy the whole digest ${digest.slice(0, 12)}`}
        onClick={() => void copy()}
      >
        copy
      </button>
      <span role="status" className="text-caption text-soft">
        {copied ? 'copied' : ''}
      </span>
    </span>
  )
}
