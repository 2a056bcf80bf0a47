/** The fields that several account forms share. */
export const NAME = { name: 'name', label: 'Name', autoComplete: 'name' } as const;
export const EMAIL = {
  name: 'email',
  label: 'E-mail address',
  type: 'email',
  autoComplete: 'email',
} as const;
export const PASSWORD = {
  name: 'password',
  label: 'Password',
  type: 'password',
  autoComplete: 'current-password',
} as const;
export const NEW_PASSWORD = {
  name: 'password',
  label: 'Password',
  type: 'password',
  autoComplete: 'new-password',
  why: 'At least 10 characters; a short sentence works well.',
} as const;
