import { z } from 'zod'
import { Id } from '@shared/http/common'

export const InTeam = z.object({ team: Id })
export const OneRow = z.object({ team: Id, id: Id })
