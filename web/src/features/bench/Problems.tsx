import type { BenchView } from './useBenchAnswer.ts'

/** What the core found wrong, and that the numbers shown are those from before. */
export function Problems({ view }: { view: BenchView }) {
  if (view.failure !== null)
    return (
      <p role="alert" className="border-l-2 border-fault pl-3">
        No converged number: {view.failure}. What is shown below is the last one that was reached.
      </p>
    )
  if (view.faults.length === 0) return null
  return (
    <div role="alert" className="border-l-2 border-fault pl-3">
      <p>This input cannot be computed; what is shown below is the last that could.</p>
      <ul>
        {view.faults.map((fault) => (
          <li key={fault.path + fault.message} className="text-small text-fault">
            <code className="font-mono">{fault.path}</code>: {fault.message}
          </li>
        ))}
      </ul>
    </div>
  )
}
