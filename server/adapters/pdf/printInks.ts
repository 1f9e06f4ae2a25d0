import type { Ink } from '@shared/court/scene'

/** Inks on paper: floor and papers are white, court lines grey (DESIGN.md section 7). */
export const PRINT_INKS: Readonly<Record<Ink, string>> = {
  graphite: '#212529',
  'graphite-2': '#4C5155',
  'graphite-3': '#5E6265',
  their: '#B93411',
  our: '#0B5566',
  ball: '#FFCB47',
  'court-line': '#8A8A86',
  axis: '#8A8A86',
  floor: '#FFFFFF',
  sheet: '#FFFFFF',
  paper: '#FFFFFF',
}
