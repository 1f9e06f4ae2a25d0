import type { RouteLocationRaw } from 'vue-router'
import type { Station } from '@shared/vocabulary'

/** One station of the prep rail as it is drawn. */
export interface RailStation {
  station: Station
  state: 'done' | 'here' | 'ahead'
  /** Under the name: what was done or is to do, who, when. */
  what?: string
  /** Initials of who has the ball. */
  holder?: string
  /** Where the station's page is; without one the name is plain text. */
  to?: RouteLocationRaw
}
