import { Link } from 'react-router-dom'
import type { Evaluation } from '#core/wire/index'
import { MEASURED_DENSITY } from '#core/constants/measured'
import { verdict } from '../../components/charts/verdict.ts'
import { Num } from '../../components/ui/Num.tsx'
import { OmegaH2 } from '../../components/ui/symbols.tsx'
import { meaningfulDigits } from '../../lib/number.ts'
import { Moment } from '../records/Moment.tsx'
import { QUIET_LINK } from '../records/quietLink.ts'
import type { RecordColumn } from '../records/RecordTable.tsx'

const verdictWords = ({ result }: Evaluation): string => verdict(result.omegaH2, MEASURED_DENSITY).words

export const revisionText = ({ name, number }: Evaluation['history']): string => `${name}@${number}`

/** The words the filter box looks among. */
export const evaluationWords = (evaluation: Evaluation): string =>
  [
    revisionText(evaluation.history),
    revisionText(evaluation.candidate),
    evaluation.author.name,
    verdictWords(evaluation),
    ...evaluation.result.guards.map((guard) => guard.code),
  ].join(' ')

export const EVALUATION_COLUMNS: readonly RecordColumn<Evaluation>[] = [
  {
    id: 'omegaH2',
    title: 'Ωχh²',
    heading: <OmegaH2 />,
    sortBy: ({ result }) => result.omegaH2,
    cell: (evaluation) => (
      <Link to={`/evaluations/${evaluation.id}`} className={`text-[1.05em] ${QUIET_LINK}`}>
        <Num
          value={evaluation.result.omegaH2}
          digits={meaningfulDigits(evaluation.result.numericalError, 4)}
        />
      </Link>
    ),
  },
  {
    id: 'verdict',
    title: 'Against measured',
    sortBy: ({ result }) => result.omegaH2 / MEASURED_DENSITY.omegaH2,
    cell: verdictWords,
  },
  {
    id: 'history',
    title: 'History',
    sortBy: ({ history }) => revisionText(history),
    cell: ({ history }) => (
      <Link to={`/histories/${history.recordId}?revision=${history.number}`} className={QUIET_LINK}>
        {revisionText(history)}
      </Link>
    ),
  },
  {
    id: 'candidate',
    title: 'Candidate',
    sortBy: ({ candidate }) => revisionText(candidate),
    cell: ({ candidate }) => (
      <Link to={`/candidates/${candidate.recordId}?revision=${candidate.number}`} className={QUIET_LINK}>
        {revisionText(candidate)}
      </Link>
    ),
  },
  { id: 'author', title: 'Author', sortBy: ({ author }) => author.name, cell: ({ author }) => author.name },
  {
    id: 'time',
    title: 'Time',
    sortBy: ({ createdAt }) => createdAt,
    cell: ({ createdAt }) => <Moment at={createdAt} />,
  },
  {
    id: 'guards',
    title: 'Guards',
    sortBy: ({ result }) => result.guards.length,
    cell: ({ result }) => <span className="number">{result.guards.length}</span>,
  },
]
