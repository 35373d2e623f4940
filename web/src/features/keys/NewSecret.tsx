import type { CreateKeyResult } from '#core/wire/index'
import { CodeBlock } from '../../components/ui/CodeBlock.tsx'
import { Button } from '../../components/ui/Button.tsx'
import { Dialog } from '../../components/ui/Dialog.tsx'
import { useCopy } from '../../components/ui/useCopy.ts'

/** The secret of a new key, the one time it is shown. */
export function NewSecret({ made, onClose }: { made: CreateKeyResult; onClose: () => void }) {
  const [state, copy] = useCopy()
  const line = `curl -H "Authorization: Bearer ${made.secret}" ${location.origin}/api/v1/histories`
  return (
    <Dialog
      open
      onOpenChange={(open) => {
        if (!open) onClose()
      }}
      title="Copy the secret now"
      description="It is not kept here and cannot be shown again. Whoever has it can do what the key may do."
    >
      <p className="rounded border border-rule bg-raised p-3">
        <code className="font-mono text-small break-all select-all">{made.secret}</code>
      </p>
      <p className="flex flex-wrap items-baseline gap-3">
        <Button onClick={() => void copy(made.secret)}>Copy the secret</Button>
        <span role="status" className="text-small text-soft">
          {state === 'copied' ? 'Copied.' : ''}
          {state === 'refused' ? 'The browser does not let this page copy: select it instead.' : ''}
        </span>
      </p>
      <p className="text-small text-soft">To try it:</p>
      <CodeBlock label="A first call">{line}</CodeBlock>
      <div className="flex justify-end">
        <Button variant="primary" onClick={onClose}>
          I have it
        </Button>
      </div>
    </Dialog>
  )
}
