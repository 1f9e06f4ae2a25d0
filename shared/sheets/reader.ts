import type { Role } from '../vocabulary'
import type { FrozenCounter, FrozenPlan, SheetView } from './schemas'

/** The role of a player in a frozen counter; null when she has none. */
const roleIn = (counter: FrozenCounter | null, squadPlayerId: string): Role | null =>
  counter?.roles.find((role) => role.squadPlayerId === squadPlayerId)?.role ?? null

/** The same sheet as one player reads it, or as everybody does (null). */
export function readBy<V extends Pick<SheetView, 'content' | 'mine'>>(
  view: V,
  squadPlayerId: string | null,
): V {
  const { firstCall, changeUp } = view.content
  const mine =
    squadPlayerId === null
      ? null
      : {
          squadPlayerId,
          firstCallRole: roleIn(firstCall, squadPlayerId),
          changeUpRole: roleIn(changeUp, squadPlayerId),
        }
  return { ...view, mine }
}

/** Which drawing of our way stands on a reader's sheet. */
export interface WayShown {
  counter: 'firstCall' | 'changeUp'
  step: number
  you: Role | null
}

/**
 * The step in which the reader decides. Somebody who plays in the change-up alone gets that one; a sheet
 * for everybody shows how the first call begins.
 */
export function wayShown(content: FrozenPlan, mine: SheetView['mine']): WayShown {
  const of = (counter: 'firstCall' | 'changeUp', you: Role): WayShown => ({
    counter,
    you,
    step: keyStepOf(content[counter], you),
  })
  if (mine?.firstCallRole) return of('firstCall', mine.firstCallRole)
  if (mine?.changeUpRole && content.changeUp) return of('changeUp', mine.changeUpRole)
  return { counter: 'firstCall', step: 0, you: null }
}

/** Index of the step in which a role decides, always one that the diagram has. */
export function keyStepOf(counter: FrozenCounter | null, role: Role): number {
  const step = counter?.roles.find((one) => one.role === role)?.keyStep ?? 0
  return Math.min(Math.max(0, step), Math.max(0, (counter?.diagram.steps.length ?? 1) - 1))
}

/** The counter that is drawn. */
export const counterShown = (content: FrozenPlan, shown: Pick<WayShown, 'counter'>): FrozenCounter =>
  (shown.counter === 'changeUp' ? content.changeUp : null) ?? content.firstCall
