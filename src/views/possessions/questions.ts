import { spotLabel } from '@shared/tendencies/habits'
import type { Slot, SlotField } from './slots'

/** `short` stands in the sentence; `long` is what a reader hears. */
export interface Question {
  short: string
  long: string
}

const QUESTIONS: Record<SlotField, Question> = {
  trigger: { short: 'what?', long: 'What came before it?' },
  shape: { short: 'did what?', long: 'What did they do?' },
  shapeVariant: { short: 'which kind?', long: 'Which kind was it?' },
  pickup: { short: 'how far up?', long: 'How far up did they pick up?' },
  trap: { short: 'where?', long: 'Where did two come to the ball? Tap the court, or choose a place.' },
  outcome: { short: 'how?', long: 'How did it end?' },
  outcomePlace: { short: 'where?', long: 'Where did it end?' },
  period: { short: 'which period?', long: 'Which period was it?' },
  clock: { short: 'time left?', long: 'How much time was left?' },
  margin: { short: 'score?', long: 'By how many did they lead?' },
  throwerGuard: { short: 'did what about the thrower?', long: 'What did they do about the thrower?' },
  denied: { short: 'whom?', long: 'Whom did they deny? Several can be chosen.' },
  tookAway: { short: 'what?', long: 'What did the trap take away? Several can be chosen.' },
  leftOpen: { short: 'what?', long: 'What did they leave open? Several can be chosen.' },
  onBall: { short: 'how on the ball?', long: 'How did they play the ball?' },
  handler: { short: 'Who?', long: 'Who had the ball?' },
  goalie: { short: 'did what?', long: 'What did the safety do?' },
  shownShape: { short: 'which shape?', long: 'Which shape did they show first?' },
  trapCue: { short: 'on what?', long: 'What was the cue of the trap?' },
  trapResult: { short: 'and then?', long: 'How did the trap end?' },
  trapTime: { short: 'when?', long: 'When was the trap, in seconds from the first touch?' },
  crossedAt: { short: 'when?', long: 'When was the ball over half, in seconds from the first touch?' },
  trappers: { short: 'by whom?', long: 'Which of theirs trapped? Their shirt numbers.' },
  onFloor: { short: 'which five?', long: 'Which five of theirs were on the floor? Their shirt numbers.' },
  forcedSide: { short: 'which way?', long: 'Which way did they steer the ball?' },
  entrySpot: { short: 'where?', long: 'Where was the throw-in caught? Tap the court, or choose a place.' },
  receiver: { short: 'whom?', long: 'Who caught the throw-in? The shirt number.' },
  thief: { short: 'whom?', long: 'Which of theirs took the ball? The shirt number.' },
  passes: { short: 'How many passes?', long: 'How many passes were there?' },
  reversals: { short: 'how many changes of side?', long: 'How often did the ball change sides?' },
  fallback: { short: 'what?', long: 'What did they play once the press was over?' },
  finish: { short: 'what?', long: 'What did it come to?' },
  points: { short: 'how many points?', long: 'How many points came of it?' },
  pointsAgainst: { short: 'how many?', long: 'How many did they score off it, within eight seconds?' },
  timeOutBurned: { short: 'A time-out?', long: 'Was a time-out burned?' },
  filmTime: { short: 'when?', long: 'Where is it on the film, from its start?' },
  counterId: { short: 'what?', long: 'Which of our counters did we call?' },
  rightCall: { short: 'the right call?', long: 'Was it the right call?' },
  runWell: { short: 'run well?', long: 'Was it run well?' },
  note: { short: 'what?', long: 'What else should be kept, in a few words?' },
  trip: { short: 'a new trip?', long: 'Was it still the same trip?' },
  more: { short: 'what else?', long: 'What else was seen?' },
}

export function questionOf(slot: Slot): Question {
  if (slot.spot !== undefined) {
    const words = spotLabel(slot.spot, 'any')
    return { short: `${words}, left or right?`, long: `Left or right ${words}, as they bring it up?` }
  }
  if (slot.field === 'trap' && (slot.trap ?? 0) > 0)
    return { short: 'where?', long: 'Where did they trap again? Tap the court, or choose a place.' }
  return QUESTIONS[slot.field]
}
