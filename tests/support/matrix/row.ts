import type { TeamRole } from '@shared/vocabulary'
import type { World } from './world'

/** What the API's description cannot say of an endpoint: rows to ask about, a body that is taken, one that is not. */
export interface Row {
  /** Fills the path's parameters with rows of a team. */
  at: (rows: World) => Record<string, string>
  success: 200 | 201 | 204
  body?: (rows: World) => object
  /** The request brings a picture. */
  still?: boolean
  ifMatch?: string
  query?: string | ((rows: World, role: TeamRole) => string)
  /** A body or query that cannot be taken, and the field that must be named; '' when only the team can be wrong. */
  bad: { body?: object; query?: string; field: string }
  /** Why it cannot be done twice, so that only the least role that may has its success looked at. */
  once?: string
}

export const badId = { field: 'id' }
