import { Button } from '../../components/ui/Button.tsx'

interface RecoveryCodesProps {
  codes: readonly string[]
  onKept: () => void
}

/** Recovery codes, shown this once. */
export const RecoveryCodes = ({ codes, onKept }: RecoveryCodesProps) => (
  <div role="status" className="grid max-w-md gap-3">
    <p>
      <strong>Keep these recovery codes.</strong> Each stands in once for a code of your app, should you lose
      it. They are shown this once.
    </p>
    <ul className="grid gap-1 font-mono text-small sm:grid-cols-2">
      {codes.map((code) => (
        <li key={code}>{code}</li>
      ))}
    </ul>
    <div className="flex flex-wrap gap-3">
      <Button onClick={() => void navigator.clipboard.writeText(codes.join('\n'))}>Copy all</Button>
      <Button variant="primary" onClick={onKept}>
        I have kept them
      </Button>
    </div>
  </div>
)
