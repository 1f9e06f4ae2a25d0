import { Counter } from './Counter'
import { Game } from './Game'
import { Membership } from './Membership'
import { Opponent } from './Opponent'
import { Person } from './Person'
import { Plan } from './Plan'
import { Possession } from './Possession'
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
]
