import { useQuery } from '@tanstack/react-query'
import { accountQuery } from '../../api/account.ts'
import { Loaded } from '../records/Loaded.tsx'
import { Page } from '../records/Page.tsx'
import { Section } from '../records/Section.tsx'
import { EmailForm } from './EmailForm.tsx'
import { NameForm } from './NameForm.tsx'
import { PasswordForm } from './PasswordForm.tsx'
import { SecondFactor } from './SecondFactor.tsx'
import { SessionList } from './SessionList.tsx'

/** One's own account: name, password, address, second factor, and the browsers one is signed in with. */
export default function AccountPage() {
  const query = useQuery(accountQuery)
  return (
    <Page title="Account">
      <h1>Account</h1>
      <Loaded of={query} what="your account">
        {(account) => (
          <div className="grid gap-x-12 gap-y-8 lg:grid-cols-2">
            <Section title="Name">
              <NameForm account={account} />
            </Section>
            <Section title="E-mail address">
              <EmailForm account={account} />
            </Section>
            <Section title="Password">
              <PasswordForm account={account} />
            </Section>
            <Section title="Second factor">
              <SecondFactor account={account} />
            </Section>
            <Section title="Signed in">
              <SessionList />
            </Section>
          </div>
        )}
      </Loaded>
    </Page>
  )
}
