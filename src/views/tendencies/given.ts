import type { TendencyFilter } from '@shared/tendencies/schemas'

/** What a situation asks for: habits about it come out every time by its own making and say nothing. */
export type Given = 'press' | 'shape' | 'pickup'

export function givenBy({ shape, pickup }: TendencyFilter): Given[] {
  const given: Given[] = []
  if (shape || pickup) given.push('press')
  if (shape) given.push('shape')
  if (pickup) given.push('pickup')
  return given
}

/** Whether a habit is about what the situation asks for. */
export function isGiven(key: string, given: readonly Given[]): boolean {
  const kind = key.split(':')[0]
  if (kind === 'press' || kind === 'fake') return given.includes('press')
  if (kind === 'shape') return given.includes('shape')
  return kind === 'pickup' && given.includes('pickup')
}
