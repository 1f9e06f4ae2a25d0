import { Change } from './Change'
import { Copy } from './Copy'
import { Counter } from './Counter'
import { Erasure } from './Erasure'
import { Game } from './Game'
import { HandOn } from './HandOn'
import { Invitation } from './Invitation'
import { Mail } from './Mail'
import { Membership } from './Membership'
import { Opening } from './Opening'
import { Opponent } from './Opponent'
import { OpponentPlayer } from './OpponentPlayer'
import { PasswordReset } from './PasswordReset'
import { Person } from './Person'
import { Plan } from './Plan'
import { Possession } from './Possession'
import { Practice } from './Practice'
import { PracticeReps } from './PracticeReps'
import { Rule } from './Rule'
import { ScoutedGame } from './ScoutedGame'
import { Sheet } from './Sheet'
import { SquadPlayer } from './SquadPlayer'
import { Still } from './Still'
import { StoredSession } from './StoredSession'
import { Team } from './Team'
import { Trap } from './Trap'

export const ENTITIES = [
  Team,
  Person,
  Membership,
  StoredSession,
  SquadPlayer,
  Opponent,
  Game,
  ScoutedGame,
  Possession,
  Trap,
  Still,
  Counter,
  Rule,
  Plan,
  Sheet,
  Change,
  OpponentPlayer,
  Invitation,
  PasswordReset,
  Erasure,
  Mail,
  Copy,
  Opening,
  Practice,
  PracticeReps,
  HandOn,
]
