import { parseArgs } from 'node:util'
import { FirstCoach } from '@shared/session/firstCoach'
import { faultsOf } from '../http/faults'
import { CommandError } from './commandError'
import type { Terminal } from './terminal'

type Field = keyof FirstCoach
type Answers = Partial<Record<Field, string>>

/** What is asked, in the order it is asked in; the password comes last and is no argument. */
const QUESTIONS: readonly (readonly [field: Exclude<Field, 'password'>, question: string])[] = [
  ['name', 'Your name: '],
  ['email', 'Your mail address: '],
  ['team', 'Name of the team: '],
  ['squad', 'Who they are, e.g. U17 girls: '],
  ['zone', 'Time zone, e.g. Europe/London: '],
  ['rules', 'Rules they play by (fiba, nfhs84, nfhs94, ncaa or nba): '],
]

const USAGE =
  'npm run first-coach -- --name "…" --email … --team "…" --squad "…" --zone Europe/London --rules fiba, with the password on standard input'

/**
 * The answers given as arguments.
 * @throws CommandError for an argument that is none of ours, and for a password: other users of the machine
 * and the shell's history would see it.
 */
function answersIn(args: readonly string[]): Answers {
  if (args.some((arg) => /^--?pass/i.test(arg)))
    throw new CommandError(
      'The password is not taken as an argument, where others could read it. Leave it out: it is asked for, or read from standard input.',
    )
  try {
    const option = { type: 'string' } as const
    const { values } = parseArgs({
      args: [...args],
      options: { name: option, email: option, team: option, squad: option, zone: option, rules: option },
    })
    return values
  } catch {
    throw new CommandError(`These arguments cannot be read. Write it as ${USAGE}.`)
  }
}

interface Faults {
  field: string
  message: string
}

/** The answers as a first coach, or what is wrong with each. */
function checkAnswers(answers: Answers): { coach: FirstCoach } | { faults: Faults[] } {
  const parsed = FirstCoach.safeParse(answers, { reportInput: true })
  return parsed.success ? { coach: parsed.data } : { faults: faultsOf(parsed.error) }
}

const nameOf = (field: string) => (field === 'password' ? 'password' : `--${field}`)

/**
 * The whole answers: from the arguments, and for what they leave out from the terminal, where a wrong answer
 * is asked for again. Without a person to ask, the password is the first line of standard input.
 * @throws CommandError with one line per field that cannot be taken.
 */
export async function collectAnswers(args: readonly string[], terminal: Terminal): Promise<FirstCoach> {
  const answers = answersIn(args)
  if (!terminal.interactive) {
    const checked = checkAnswers({ ...answers, password: await terminal.readLine() })
    if ('coach' in checked) return checked.coach
    throw new CommandError(...checked.faults.map(({ field, message }) => `${nameOf(field)}: ${message}`))
  }
  for (const [field, question] of QUESTIONS)
    await settle(answers, field, terminal, () => terminal.ask(question))
  await settle(answers, 'password', terminal, () => askPassword(terminal))
  return FirstCoach.parse(answers)
}

/** Asks for one field until it can be taken; what the arguments gave is asked for only when it cannot. */
async function settle(
  answers: Answers,
  field: Field,
  terminal: Terminal,
  ask: () => Promise<string>,
): Promise<void> {
  answers[field] ??= await ask()
  for (;;) {
    const checked = checkAnswers(answers)
    const fault = 'faults' in checked ? checked.faults.find((each) => each.field === field) : undefined
    if (!fault) return
    terminal.say(fault.message)
    answers[field] = await ask()
  }
}

async function askPassword(terminal: Terminal): Promise<string> {
  for (;;) {
    const password = await terminal.askHidden('Password, not shown while you type: ')
    if ((await terminal.askHidden('The same password again: ')) === password) return password
    terminal.say('The two differ. Type both again.')
  }
}
