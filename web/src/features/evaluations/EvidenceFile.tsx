import type { EvidenceBundle } from '#core/wire/index'
import { Button } from '../../components/ui/Button.tsx'
import { saveFile } from '../../lib/saveFile.ts'

/** Hands out the evidence bundle: one file that the command repeats and checks. */
export function EvidenceFile({ bundle }: { bundle: EvidenceBundle }) {
  const save = (): void =>
    saveFile(
      new Blob([`${JSON.stringify(bundle, null, 2)}\n`], { type: 'application/json' }),
      'evidence.json',
    )
  return (
    <div className="grid justify-items-start gap-1">
      <Button onClick={save}>Save the evidence</Button>
      <p className="text-caption text-soft">
        Inputs, outputs and digests in one file; <code className="font-mono">{bundle.repeat}</code> repeats
        it.
      </p>
    </div>
  )
}
