import { TextField } from '../../components/ui/TextField.tsx'

interface NewPasswordFieldProps {
  label: string
  fault: string | undefined
  value: string
  onChange: (value: string) => void
}

/** Where a password is chosen. */
export const NewPasswordField = (props: NewPasswordFieldProps) => (
  <TextField
    {...props}
    hint="8 characters or more, of any kind; a few words make a good one."
    type="password"
    autoComplete="new-password"
  />
)
