import { spotAt } from '@shared/court/trapSpots'
import type { PossessionBody, PossessionRow, StillRow } from '@shared/possessions/schemas'
import { marksOf } from '@shared/stills/marks'
import { NOT_PRESSED, NOT_VISIBLE } from '@shared/vocabulary'
import type { Possession } from '../../database/entities/Possession'
import type { Still } from '../../database/entities/Still'
import type { Trap } from '../../database/entities/Trap'
import { metaOf } from '../../http/present'

/** A possession with its traps and stills loaded. */
export interface WholePossession {
  row: Possession
  traps: Trap[]
  stills: Still[]
}

const bodyOfTrap = ({ x, y, t, cue, trappers, result }: Trap) => ({ x, y, t, cue, trappers, result })

/** The stored row as the body that would have made it. */
export function bodyOfPossession(row: Possession, traps: Trap[]): PossessionBody {
  return {
    frame: row.frame,
    scoutedGameId: row.scoutedGameId,
    gameId: row.gameId,
    tripId: row.tripId,
    number: row.number,
    period: row.period,
    clock: row.clock,
    margin: row.margin,
    trigger: row.trigger,
    shape: row.shape,
    shapeVariant: row.shapeVariant,
    pickup: row.pickup,
    traps: row.trapsLogged === null ? null : row.trapsLogged === 'seen' ? traps.map(bodyOfTrap) : NOT_VISIBLE,
    outcome: row.outcome,
    outcomePlace: row.outcomePlace,
    throwerGuard: row.throwerGuard,
    denied: row.denied,
    tookAway: row.tookAway,
    leftOpen: row.leftOpen,
    onBall: row.onBall,
    handler: row.handler,
    goalie: row.goalie,
    shownShape: row.shownShape,
    forcedSide: row.forcedSide,
    entrySpot: row.entrySpot,
    receiver: row.receiver,
    onFloor: row.onFloor,
    thief: row.thief,
    passes: row.passes,
    reversals: row.reversals,
    fallback: row.fallback,
    finish: row.finish,
    points: row.points,
    pointsAgainst: row.pointsAgainst,
    timeOutBurned: row.timeOutBurned,
    filmTime: row.filmTime,
    crossedAt: row.crossedAt,
    track: row.track,
    note: row.note,
    counterId: row.counterId,
    rightCall: row.rightCall,
    runWell: row.runWell,
  }
}

export function presentStill(still: Still): StillRow {
  // Its address changes with its pixels, so that nothing that was kept shows what was burned away.
  const url = `/api/teams/${still.teamId}/stills/${still.id}?pixels=${still.blurred}`
  return {
    id: still.id,
    version: still.version,
    position: still.position,
    t: still.t,
    caption: still.caption,
    width: still.width,
    height: still.height,
    url: `${url}&size=full`,
    thumbnailUrl: `${url}&size=thumbnail`,
    marks: marksOf(still.marks),
    blurred: still.blurred,
    facesLeft: still.facesLeft,
    inReport: still.inReport,
    expiresOn: still.expiresOn,
  }
}

export function presentPossession({ row, traps, stills }: WholePossession): PossessionRow {
  const body = bodyOfPossession(row, traps)
  return {
    ...metaOf(row),
    ...body,
    traps: Array.isArray(body.traps) ? body.traps.map((trap) => ({ ...trap, ...spotAt(trap) })) : body.traps,
    pressed: row.shape === null ? null : !NOT_PRESSED.includes(row.shape),
    stills: stills.map(presentStill),
  }
}
