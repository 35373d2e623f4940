import type { Evaluation } from '#core/wire/index'
import { CopyDigest } from '../records/CopyDigest.tsx'

/** What is kept with a result so that it can be repeated. */
export function KeptWith({ evaluation }: { evaluation: Evaluation }) {
  return (
    <dl className="grid grid-cols-[auto_minmax(0,1fr)] gap-x-5 gap-y-1 text-small [&>dt]:text-soft">
      <dt>Core version</dt>
      <dd className="number">{evaluation.coreVersion}</dd>
      <dt>Digest of the inputs</dt>
      <dd>
        <CopyDigest digest={evaluation.inputDigest} />
      </dd>
    </dl>
  )
}
