import type { BenchView } from './useBenchAnswer.ts'

/** What went wrong with the present input, and that the numbers shown are those from before. */
export function Problems({ view }: { view: BenchView }) {
  const { failure, faults } = view
  const shown = view.report === null ? '' : ' What is shown below is the last that could be computed.'
  if (failure)
    return (
      <p role="alert" className="border-l-2 border-fault pl-3">
        {failure.of === 'convergence'
          ? `No converged number: ${failure.reason}.`
          : `The part of Emberline that computes has stopped: ${failure.reason}. The next change starts it again; reload the page if it does not.`}
        {shown}
      </p>
    )
  if (faults.length === 0) return null
  return (
    <div role="alert" className="border-l-2 border-fault pl-3">
      <p>This input cannot be computed.{shown}</p>
      <ul>
        {faults.map((fault) => (
          <li key={fault.path + fault.message} className="text-small text-fault">
            <code className="font-mono">{fault.path}</code>: {fault.message}
          </li>
        ))}
      </ul>
    </div>
  )
}
