import { useQuery } from '@tanstack/react-query'
import { useParams } from 'react-router-dom'
import { historyQuery } from '../../api/records.ts'
import { benchLink } from './benchLink.ts'
import { HistoryInputs } from './Inputs.tsx'
import { Loaded } from './Loaded.tsx'
import { Page } from './Page.tsx'
import { RecordPage } from './RecordPage.tsx'
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
          >
            {(input) => <HistoryInputs input={input} />}
          </RecordPage>
        )}
      </Loaded>
    </Page>
  )
}
