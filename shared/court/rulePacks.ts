import { z } from 'zod'

export const RulePackKey = z.enum(['fiba', 'nfhs84', 'nfhs94', 'ncaa', 'nba'])
export type RulePackKey = z.infer<typeof RulePackKey>
