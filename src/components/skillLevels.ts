/** The words of a skill's level, 0 to 3 (common practice, no source). */
export const LEVELS = ['not yet', 'when free', 'under pressure', 'our best'] as const
