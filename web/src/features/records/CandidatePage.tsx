import { useQuery } from '@tanstack/react-query'
import { useParams } from 'react-router-dom'
import { candidateQuery } from '../../api/records.ts'
import { benchLink } from './benchLink.ts'
import { CandidateInputs } from './Inputs.tsx'
import { Loaded } from './Loaded.tsx'
import { Page } from './Page.tsx'
import { RecordPage } from './RecordPage.tsx'
import { candidateWordings } from './wordings.ts'

/** One candidate with all its revisions. */
export default function CandidatePage() {
  const { id = '' } = useParams()
  const candidate = useQuery(candidateQuery(id))
  return (
    <Page title={candidate.data?.name ?? 'Candidate'}>
      <Loaded of={candidate} what="the candidate">
        {(record) => (
          <RecordPage
            key={record.id}
            record={record}
            list={{ title: 'Candidates', path: '/candidates' }}
            uses={{ candidateId: record.id }}
            benchLinkOf={(number) => benchLink({ candidate: { recordId: record.id, number } })}
            inputTitle="Particle"
            wordings={candidateWordings}
          >
            {(input) => <CandidateInputs input={input} />}
          </RecordPage>
        )}
      </Loaded>
    </Page>
  )
}
