import { useState } from 'react'
import { CodeBlock } from '../../components/ui/CodeBlock.tsx'
import { Button } from '../../components/ui/Button.tsx'
import { SegmentedChoice } from '../../components/ui/SegmentedChoice.tsx'
import { useCopy } from '../../components/ui/useCopy.ts'
import { exampleBody, goodAnswer, takesKey } from './apiDocument.ts'
import type { Call } from './apiDocument.ts'
import { curlSnippet, pythonSnippet } from './snippets.ts'

const LANGUAGES = [
  { value: 'curl', label: 'curl' },
  { value: 'python', label: 'Python' },
] as const

/** One call: its address and purpose in a line, the rest when opened. */
export function CallEntry({ call }: { call: Call }) {
  const [open, setOpen] = useState(false)
  return (
    <details className="py-2" onToggle={(event) => setOpen(event.currentTarget.open)}>
      <summary className="cursor-pointer">
        <code className="font-mono text-small">
          <span className="font-semibold">{call.method.toUpperCase()}</span> {call.path}
        </code>
        <span className="block pl-4 text-small text-soft sm:inline sm:pl-3">{call.operation.summary}</span>
      </summary>
      {open ? <CallBody call={call} /> : null}
    </details>
  )
}

function CallBody({ call }: { call: Call }) {
  const body = exampleBody(call)
  const answer = goodAnswer(call)
  const problems = Object.entries(call.operation.responses).filter(([status]) => !status.startsWith('2'))
  return (
    <div className="grid grid-cols-[minmax(0,1fr)] gap-3 pt-2 pb-4 pl-4">
      {call.operation.parameters?.length ? <Parameters call={call} /> : null}
      {takesKey(call) ? (
        <Snippet call={call} />
      ) : (
        <p className="text-small text-soft">Done by a person in a browser; no key reaches it.</p>
      )}
      {body === undefined ? null : <Json title="Takes" value={body} />}
      {answer === null ? null : answer.example === undefined ? (
        <p className="text-small text-soft">
          {answer.status}: {answer.is}.
        </p>
      ) : (
        <Json title={`Answers ${answer.status}: ${answer.is}`} value={answer.example} />
      )}
      <p className="text-small text-soft">
        {problems.map(([status, { description }]) => `${status} ${description}`).join(' · ')}
      </p>
    </div>
  )
}

function Parameters({ call }: { call: Call }) {
  return (
    <dl className="grid grid-cols-[auto_minmax(0,1fr)] gap-x-5 gap-y-1 text-small">
      {call.operation.parameters!.map(({ name, in: where, required, description, schema }) => (
        <div key={name} className="contents">
          <dt>
            <code className="font-mono">{name}</code>
          </dt>
          <dd className="text-soft">
            {[
              where === 'path' ? 'in the address' : required ? 'required' : 'optional',
              schema?.enum ? schema.enum.join(' | ') : schema?.type,
              schema?.default === undefined ? null : `${String(schema.default)} unless given`,
              description ?? schema?.description,
            ]
              .filter((part) => part !== null && part !== undefined)
              .join('; ')}
          </dd>
        </div>
      ))}
    </dl>
  )
}

function Snippet({ call }: { call: Call }) {
  const [language, setLanguage] = useState<'curl' | 'python'>('curl')
  const [state, copy] = useCopy()
  const text = language === 'curl' ? curlSnippet(call, location.origin) : pythonSnippet(call, location.origin)
  return (
    <div className="grid grid-cols-[minmax(0,1fr)] gap-1.5">
      <div className="flex flex-wrap items-center gap-3">
        <SegmentedChoice label="Language" value={language} options={LANGUAGES} onChange={setLanguage} />
        <Button variant="link" onClick={() => void copy(text)}>
          copy
        </Button>
        <span role="status" className="text-caption text-soft">
          {state === 'copied' ? 'copied' : ''}
          {state === 'refused' ? 'The browser does not let this page copy: select it instead.' : ''}
        </span>
      </div>
      <CodeBlock label={`In ${language}`}>{text}</CodeBlock>
    </div>
  )
}

const Json = ({ title, value }: { title: string; value: unknown }) => (
  <div className="grid grid-cols-[minmax(0,1fr)] gap-1">
    <p className="text-small font-semibold">{title}</p>
    <CodeBlock label={title}>{JSON.stringify(value, null, 2)}</CodeBlock>
  </div>
)
