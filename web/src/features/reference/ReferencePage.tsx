import { useQuery } from '@tanstack/react-query'
import { Link } from 'react-router-dom'
import { apiDocumentQuery } from '../../api/reference.ts'
import { Loaded } from '../records/Loaded.tsx'
import { Page } from '../records/Page.tsx'
import { Section } from '../records/Section.tsx'
import { CallEntry } from './CallEntry.tsx'
import { callsByTag } from './apiDocument.ts'
import type { ApiDocument } from './apiDocument.ts'
import { KEY_VARIABLE } from './snippets.ts'

/** Every address of the API with what it takes and answers, and how to call it. */
export default function ReferencePage() {
  const query = useQuery(apiDocumentQuery)
  return (
    <Page title="API reference">
      <header>
        <h1>API reference</h1>
        <p className="max-w-prose text-soft">
          The same numbers as on the pages, for scripts. Make a key under{' '}
          <Link to="/keys" className="link">
            API keys
          </Link>
          , keep its secret in the variable <code className="font-mono text-small">{KEY_VARIABLE}</code>, and
          send it with each request. The whole description as OpenAPI 3.1:{' '}
          <a href="/api/openapi.json" className="link">
            openapi.json
          </a>
          .
        </p>
      </header>
      <Loaded of={query} what="the API’s description">
        {(document) => <Calls document={document} />}
      </Loaded>
    </Page>
  )
}

function Calls({ document }: { document: ApiDocument }) {
  const tags = [...callsByTag(document)]
  return (
    <>
      <p className="max-w-prose text-small text-soft">
        <WithCode text={document.info.description} />
      </p>
      <nav aria-label="Parts of the API" className="flex flex-wrap gap-x-5 gap-y-1">
        {tags.map(([tag]) => (
          <a key={tag} href={`#${tag}`} className="link">
            {tag}
          </a>
        ))}
      </nav>
      {tags.map(([tag, calls]) => (
        <div key={tag} id={tag}>
          <Section title={tag}>
            <ul className="rows">
              {calls.map((call) => (
                <li key={call.operation.operationId}>
                  <CallEntry call={call} />
                </li>
              ))}
            </ul>
          </Section>
        </div>
      ))}
    </>
  )
}

/** Text in which backticks mark what is code, as descriptions in OpenAPI have it. */
const WithCode = ({ text }: { text: string }) =>
  text.split('`').map((part, i) =>
    i % 2 === 0 ? (
      part
    ) : (
      <code key={i} className="font-mono">
        {part}
      </code>
    ),
  )
