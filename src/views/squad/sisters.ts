/** The squad's pages, for the words beside each page's name. */
export const sistersOf = (team: string, current: 'squad' | 'people' | 'settings') => [
  { label: 'Players', to: { name: 'squad', params: { team } }, current: current === 'squad' },
  { label: 'People', to: { name: 'people', params: { team } }, current: current === 'people' },
  { label: 'Team', to: { name: 'settings', params: { team } }, current: current === 'settings' },
]
