import { useQuery } from '@tanstack/react-query'
import { useParams } from 'react-router-dom'
import { historyQuery } from '../../api/records.ts'
import { GuestLinks } from '../guest/GuestLinks.tsx'
import { benchLink } from './benchLink.ts'
import { HistoryInputs } from './Inputs.tsx'
import { Loaded } from './Loaded.tsx'
import { Page } from './Page.tsx'
import { RecordPage } from './RecordPage.tsx'
import { Section } from './Section.tsx'
import { historyWordings } from './wordings.ts'

/** One history with all its revisions. */
export default function HistoryPage() {
  const { id = '' } = useParams()
  const history = useQuery(historyQuery(id))
  return (
    <Page title={history.data?.name ?? 'History'}>
      <Loaded of={history} what="the history">
        {(record) => (
          <RecordPage
            key={record.id}
            record={record}
            list={{ title: 'Histories', path: '/histories' }}
            uses={{ historyId: record.id }}
            benchLinkOf={(number) => benchLink({ history: { recordId: record.id, number } })}
            inputTitle="Assumptions"
            wordings={historyWordings}
            beside={(shown) => (
              <Section title={`Guest links to revision ${shown.number}`}>
                <GuestLinks
                  key={shown.id}
                  kind="history-revision"
                  subjectId={shown.id}
                  what="this revision"
                />
              </Section>
            )}
          >
            {(input) => <HistoryInputs input={input} />}
          </RecordPage>
        )}
      </Loaded>
    </Page>
  )
}
