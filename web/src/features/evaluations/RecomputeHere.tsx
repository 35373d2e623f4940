import { useState } from 'react'
import type { AbundanceResult } from '#core/wire/index'
import { Button } from '../../components/ui/Button.tsx'
import { Num } from '../../components/ui/Num.tsx'
import type { RecomputeReply, RecomputeRequest } from '../../workers/recompute.worker.ts'
import { agreement, recompute } from './recompute.ts'

interface RecomputeHereProps {
  request: RecomputeRequest
  stored: AbundanceResult
}

/** Computes the stored number again in this browser and says whether it still comes out. */
export function RecomputeHere({ request, stored }: RecomputeHereProps) {
  const [busy, setBusy] = useState(false)
  const [reply, setReply] = useState<RecomputeReply | null>(null)
  const ask = async (): Promise<void> => {
    setBusy(true)
    setReply(await recompute(request))
    setBusy(false)
  }
  return (
    <div className="grid justify-items-start gap-2">
      <Button busy={busy} onClick={() => void ask()}>
        Recompute here
      </Button>
      <div role="status">{reply === null || busy ? null : <Outcome reply={reply} stored={stored} />}</div>
    </div>
  )
}

function Outcome({ reply, stored }: { reply: RecomputeReply; stored: AbundanceResult }) {
  if ('error' in reply)
    return (
      <p className="text-fault">
        It could not be computed here: {reply.error} The stored evaluation is unchanged; try again.
      </p>
    )
  const { agrees, relativeDifference, allowed } = agreement(reply.omegaH2, stored)
  return (
    <p>
      <strong className={agrees ? 'text-good' : 'text-fault'}>{agrees ? 'It agrees.' : 'It differs.'}</strong>{' '}
      This browser finds <Num value={reply.omegaH2} digits={10} /> with core {reply.coreVersion}; relative
      difference <Num value={relativeDifference} digits={2} />, allowed <Num value={allowed} digits={2} />.
    </p>
  )
}
