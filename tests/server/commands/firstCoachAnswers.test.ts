import { Readable } from 'node:stream'
import { describe, expect, it } from 'vitest'
import { CommandError } from '@server/commands/commandError'
import { collectAnswers } from '@server/commands/firstCoachAnswers'
import { firstLine, type Terminal } from '@server/commands/terminal'

const COACH = {
  name: 'Ada Fennimore',
  email: 'ada@club.example',
  team: 'Saltmarsh Otters',
  squad: 'U15 girls',
  zone: 'Europe/Oslo',
  rules: 'fiba',
}
const PASSWORD = 'nine tall otters'
const argsOf = (coach: Partial<typeof COACH>) =>
  Object.entries(coach).flatMap(([field, value]) => [`--${field}`, value])

/** Somebody who answers each question in turn; keeps what was asked and said. */
function person(...answers: string[]) {
  const asked: string[] = []
  const said: string[] = []
  const answer = (question: string) => {
    asked.push(question)
    const next = answers.shift()
    return next === undefined
      ? Promise.reject(new Error(`nothing to answer to ${question}`))
      : Promise.resolve(next)
  }
  const terminal: Terminal = {
    interactive: true,
    say: (line) => said.push(line),
    ask: answer,
    askHidden: (question) => answer(`hidden: ${question}`),
    readLine: () => Promise.reject(new Error('nothing was piped in')),
  }
  return { terminal, asked, said }
}
const pipe = (password: string): Terminal => ({
  ...person().terminal,
  interactive: false,
  readLine: () => Promise.resolve(password),
})
const linesOf = (answers: Promise<unknown>) =>
  answers.then(
    () => [],
    (error: unknown) => {
      if (error instanceof CommandError) return error.lines
      throw error
    },
  )

describe('the first coach', () => {
  it('comes from the arguments and a piped password, and is never asked anything', async () => {
    expect(await collectAnswers(argsOf({ ...COACH, email: ' ADA@Club.Example ' }), pipe(PASSWORD))).toEqual({
      ...COACH,
      password: PASSWORD,
    })
  })

  it('without a person to ask is told every field that cannot be taken, in one line of ours each', async () => {
    const wrong = { ...COACH, name: ' ', email: 'ada', zone: 'Mars', rules: 'beach', squad: 'x'.repeat(81) }
    const lines = await linesOf(collectAnswers(argsOf(wrong), pipe('short')))
    expect([...lines].sort()).toEqual([
      '--email: This is not a mail address. Write it as name@club.example.',
      '--name: This is empty. Fill it in.',
      '--rules: Choose one of: fiba, nfhs84, nfhs94, ncaa, nba.',
      '--squad: Use at most 80 characters.',
      '--zone: This is not a time zone. Write it as Europe/London.',
      'password: Use at least 10 characters.',
    ])
    expect(await linesOf(collectAnswers(argsOf({ ...COACH, zone: '+01:00' }), pipe(PASSWORD)))).toEqual([
      '--zone: This is not a time zone. Write it as Europe/London.',
    ])
    expect(await linesOf(collectAnswers(['--name', 'Ada'], pipe('')))).toHaveLength(6)
  })

  it('is asked for what the arguments leave out, and again for what cannot be taken', async () => {
    const { email: _email, rules: _rules, ...given } = COACH
    const { terminal, asked, said } = person(
      'nobody',
      COACH.email,
      COACH.rules,
      'short',
      'short',
      PASSWORD,
      'nine tall otter',
      PASSWORD,
      PASSWORD,
    )
    expect(await collectAnswers(argsOf(given), terminal)).toEqual({ ...COACH, password: PASSWORD })
    expect(said).toEqual([
      'This is not a mail address. Write it as name@club.example.',
      'Use at least 10 characters.',
      'The two differ. Type both again.',
    ])
    expect(asked.filter((question) => /assword/.test(question)).every((q) => q.startsWith('hidden: '))).toBe(
      true,
    )
  })

  it.each([['--password=nine tall otters'], ['--password'], ['--pass'], ['-password']])(
    'is refused with %s, without the password being said again',
    async (arg) => {
      const lines = await linesOf(collectAnswers([...argsOf(COACH), arg, 'nine tall otters'], pipe('')))
      expect(lines).toHaveLength(1)
      expect(lines[0]).toMatch(/^The password is not taken as an argument/)
      expect(lines[0]).not.toContain('otters')
    },
  )

  it('with an argument that is none of ours is shown how to write it', async () => {
    for (const args of [['--nmae', 'Ada'], ['Ada'], ['--name']]) {
      const lines = await linesOf(collectAnswers(args, pipe(PASSWORD)))
      expect(lines).toHaveLength(1)
      expect(lines[0]).toMatch(/^These arguments cannot be read\. Write it as npm run first-coach/)
    }
  })
})

describe('a piped password', () => {
  it.each([
    [['nine tall', ' otters\nmore\n'], 'nine tall otters'],
    [['nine tall otters\r\n'], 'nine tall otters'],
    [[' nine tall otters '], ' nine tall otters '],
    [[], ''],
  ])('%j is its first line as it stands', async (chunks, line) => {
    expect(await firstLine(Readable.from(chunks))).toBe(line)
  })
})
