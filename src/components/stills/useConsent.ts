import { computed } from 'vue'
import { listSquad } from '@/api/squad'
import { useAsync } from '@/composables/useAsync'
import { useTeam } from '@/composables/useTeam'
import type { Consent } from './cautionWords'

/**
 * What our players' guardians have said to pictures of them, counted; null where ours are not in the picture, and
 * while it is not known.
 */
export function useConsent(ours: () => boolean) {
  const { teamId } = useTeam()
  const squad = useAsync(async (signal) => (ours() ? (await listSquad(teamId, signal)).rows : []), {
    watch: ours,
  })
  return computed<Consent | null>(() => {
    const rows = squad.data
    if (!ours() || rows === null || rows.length === 0) return null
    const said = (answer: (typeof rows)[number]['pictureConsent']) =>
      rows.filter(({ pictureConsent }) => pictureConsent === answer).length
    return { yes: said('yes'), no: said('no'), notAsked: said('not-asked') }
  })
}
