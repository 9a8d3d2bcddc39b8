/** Every page URL. Pages and links take them from here and nowhere else. */
export const paths = {
  home: () => '/',
  signIn: (next?: string) =>
    next === undefined || next === '/' ? '/sign-in' : `/sign-in?next=${encodeURIComponent(next)}`,
  forgotPassword: () => '/forgot-password',
  resetPassword: () => '/reset-password',
  today: () => '/today',
  joints: () => '/joints',
  me: () => '/me',
  squad: () => '/squad',
  clients: () => '/clients',
  athlete: (athleteId: string) => `/athletes/${athleteId}`,
  slotSwaps: (slotId: string) => `/slots/${slotId}/swaps`,
  exerciseSwaps: (athleteId: string, exerciseId: string) => `/athletes/${athleteId}/exercises/${exerciseId}/swaps`,
  catalogue: () => '/catalogue',
  exercise: (slug: string) => `/catalogue/${slug}`,
  flags: () => '/flags',
  trail: () => '/trail',
} as const
