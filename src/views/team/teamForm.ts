import { OwnCourt } from '@shared/court/ownCourt'
import { FIGURE_KEYS, FIGURES, figureOf, type FigureKey } from '@shared/team/figures'
import type { TeamBody, TeamRow } from '@shared/team/settings'

/** Sides and counts of our own hall that the page asks for, as they are named there. */
export const COURT_FIELDS = {
  length: { label: 'Length', unit: 'm', step: 0.01 },
  width: { label: 'Width', unit: 'm', step: 0.01 },
  freeThrowLine: { label: 'Free-throw line from the endline', unit: 'm', step: 0.01 },
  laneWidth: { label: 'Lane, from edge to edge', unit: 'm', step: 0.01 },
  threePoint: { label: 'Radius of the arc', unit: 'm', step: 0.01 },
  throwInSeconds: { label: 'Throw-in count', unit: 's', step: 1 },
  backcourtSeconds: { label: 'Backcourt count', unit: 's', step: 1 },
} as const
export type CourtField = keyof typeof COURT_FIELDS
export const COURT_KEYS = Object.keys(COURT_FIELDS) as CourtField[]

/** What the page holds: every number there is, set or not. */
export interface TeamForm {
  name: string
  squadName: string
  timeZone: string
  season: string
  rulePack: TeamBody['rulePack']
  attachSheet: boolean
  ownCourt: boolean
  /** Null: as the rule set has it. */
  court: Record<CourtField, number | null>
  figures: Record<FigureKey, number>
}

export const formOf = ({ settings, ...row }: TeamBody | TeamRow): TeamForm => ({
  name: row.name,
  squadName: row.squadName,
  timeZone: row.timeZone,
  season: row.season,
  rulePack: row.rulePack,
  attachSheet: settings.attachSheet,
  ownCourt: settings.ownCourt !== null,
  court: Object.fromEntries(
    COURT_KEYS.map((key) => [key, settings.ownCourt?.[key] ?? null]),
  ) as TeamForm['court'],
  figures: Object.fromEntries(
    FIGURE_KEYS.map((key) => [key, figureOf(settings.figures, key)]),
  ) as TeamForm['figures'],
})

/** The body that a PUT sends: a figure at its default is left out, so that a better default reaches it. */
export function bodyOf(form: TeamForm): TeamBody {
  const set = FIGURE_KEYS.filter((key) => form.figures[key] !== FIGURES[key].value)
  const court = COURT_KEYS.filter((key) => form.court[key] !== null)
  return {
    name: form.name.trim(),
    squadName: form.squadName.trim(),
    timeZone: form.timeZone.trim(),
    season: form.season.trim(),
    rulePack: form.rulePack,
    settings: {
      attachSheet: form.attachSheet,
      figures: Object.fromEntries(set.map((key) => [key, form.figures[key]])),
      ownCourt: form.ownCourt
        ? OwnCourt.parse(Object.fromEntries(court.map((key) => [key, form.court[key]])))
        : null,
    },
  }
}

/** Whether what is on the page would change anything. */
export const isChanged = (form: TeamForm, row: TeamRow): boolean =>
  JSON.stringify(form) !== JSON.stringify(formOf(row))

/** Names of the fields as a fault of the server names them. */
export const FIELD_LABELS: Record<string, string> = {
  name: 'Name',
  squadName: 'Who they are',
  timeZone: 'Time zone',
  season: 'Season',
  ...Object.fromEntries(FIGURE_KEYS.map((key) => [`settings.figures.${key}`, FIGURES[key].label])),
  ...Object.fromEntries(COURT_KEYS.map((key) => [`settings.ownCourt.${key}`, COURT_FIELDS[key].label])),
}
