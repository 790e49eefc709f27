/** Every address of the client, as the router reads it; `generatePath` of react-router fills the parameters. */
export const paths = {
  start: '/',
  signIn: '/sign-in',
  signUp: '/sign-up',
  forgotPassword: '/forgot-password',
  resetPassword: '/reset-password/:token',
  groupHome: '/groups/:groupId',
  materials: '/groups/:groupId/materials',
  people: '/groups/:groupId/people',
  runs: '/groups/:groupId/runs',
  stack: '/stacks/:stackId',
  material: '/materials/:materialId',
  run: '/runs/:runId',
  share: '/share/:token',
  conventions: '/conventions',
  account: '/account',
  mails: '/development/mails',
} as const;
