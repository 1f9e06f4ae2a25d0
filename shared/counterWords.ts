import { terms } from './vocabulary'

/** The closed lists of our own book: what a counter is, offers and asks of a player, and how much a rule weighs. */

export const FAMILIES = terms([
  { value: '1-4-across', label: '1-4 across', definition: 'Four at the foul line, wide.' },
  { value: 'stack', label: 'Stack', definition: 'A tight column facing the ball.' },
  { value: 'box', label: 'Box', definition: 'Two high, two low.' },
  { value: 'line', label: 'Line', definition: 'A spaced file up the lane.' },
  { value: 'two-up', label: 'Two up', definition: 'Guards at the elbows, two at half.' },
  { value: 'diamond', label: 'Diamond spacing', definition: 'Ahead, diagonal, behind and far.' },
  { value: 'four-up', label: 'Four up', definition: 'Four sprint, one comes back.' },
  { value: 'sideline', label: 'Sideline', definition: 'Two up one line, the middle filled.' },
  { value: 'clear-out', label: 'Clear-out', definition: 'Four leave, the handler stays.' },
  { value: 'diagonal', label: 'Diagonal', definition: 'Wings cut to the ball line, the opposite fills.' },
])
export type Family = (typeof FAMILIES)[number]['value']

/** What a counter offers. A rule's demand names one of these. */
export const TRAITS = terms([
  { value: 'middle-entry', label: 'middle entry', definition: 'A catch between the lanes, short of half.' },
  { value: 'sideline-entry', label: 'sideline entry', definition: 'A flash up the line past their wing.' },
  { value: 'corner-entry', label: 'corner entry', definition: 'The first catch is in a deep corner.' },
  { value: 'long-threat', label: 'long threat', definition: 'Somebody deep whom the safety must mind.' },
  { value: 'deep-first-look', label: 'long pass first', definition: 'The long pass is the first look.' },
  { value: 'valve-behind', label: 'valve behind', definition: 'An outlet behind the ball at every catch.' },
  {
    value: 'return-to-thrower',
    label: 'return to the thrower',
    definition: 'The thrower steps in and gets it back.',
  },
  {
    value: 'far-side-reversal',
    label: 'far-side reversal',
    definition: 'The ball changes sides behind the trap.',
  },
  {
    value: 'far-diagonal',
    label: 'far diagonal',
    definition: 'A pass across the press to the far side ahead.',
  },
  {
    value: 'ball-side-screens',
    label: 'screens on the ball side',
    definition: 'Screens free the first receiver.',
  },
  {
    value: 'over-the-top',
    label: 'throw-in over the top',
    definition: 'The throw-in may go over the first line.',
  },
  { value: 'end-line-run', label: 'end-line run', definition: 'The thrower runs the line before throwing.' },
  { value: 'clear-out', label: 'clear-out', definition: 'Everybody leaves; the handler goes alone.' },
  { value: 'clear-path', label: 'clear path', definition: 'Nobody stands in the dribbler’s way.' },
  { value: 'quick-entry', label: 'quick entry', definition: 'The ball is in before the press is set.' },
  {
    value: 'two-guard-front',
    label: 'two-guard front',
    definition: 'Two handlers side by side below the press.',
  },
  {
    value: 'catch-off-lines',
    label: 'catch off the lines',
    definition: 'First catch 2 m or more from any line.',
  },
  {
    value: 'screening-handler',
    label: 'weak handler screens',
    definition: 'The weak handler screens or stays deep.',
  },
  { value: 'universal', label: 'any press', definition: 'Has an answer for every shape.' },
  { value: 'big-outlet', label: 'big as second outlet', definition: 'A big comes back as second outlet.' },
])
export type Trait = (typeof TRAITS)[number]['value']

/** What a role may ask of a player, and what the squad list counts for each player, 0 to 3. */
export const SKILLS = terms([
  { value: 'handle', label: 'handles the ball', definition: 'Brings it up against pressure.' },
  { value: 'throw-in', label: 'throws in', definition: 'Sees over, keeps the count, does not panic.' },
  { value: 'long-arm', label: 'long pass', definition: 'Throws past half on a line.' },
  { value: 'decide', label: 'decides in the middle', definition: 'Catches, turns, picks the right pass.' },
  { value: 'sprint', label: 'sprints', definition: 'First up the court.' },
  { value: 'screen', label: 'screens', definition: 'Sets it still and legal, and holds it.' },
])
export type Skill = (typeof SKILLS)[number]['value']

export const STRENGTHS = terms([
  { value: 'light', label: 'a little', definition: 'Weight .2 (setting).' },
  { value: 'medium', label: 'clearly', definition: 'Weight .4 (setting).' },
  { value: 'strong', label: 'strongly', definition: 'Weight .7 (setting).' },
])
export type Strength = (typeof STRENGTHS)[number]['value']
