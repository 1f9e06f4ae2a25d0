import { computed, ref, shallowRef, watch } from 'vue'
import { rulePack } from '@shared/court/rulePacks'
import { LIMITS } from '@shared/limits'
import type { PossessionRow, StillRow } from '@shared/possessions/schemas'
import { deletePossession, putPossession, restorePossession } from '@/api/possessions'
import { deleteStill, putStill } from '@/api/stills'
import type { Call } from './answer'
import { answersOf } from './answers'
import { readSeconds } from './clockWords'
import { withoutRow, withRow, withStills } from './logData'
import type { LogGame } from './logGame'
import { logRows, type LogRow } from './logRows'
import type { Act } from './acts'
import { textOf } from './parts'
import { questionOf } from './questions'
import { sentenceOf } from './sentence'
import { typedOf } from './typed'
import { useLogLine } from './useLogLine'
import { useOutbox } from './useOutbox'
import { usePictures } from './usePictures'
import { useThrownAway } from './useThrownAway'

export interface LogOptions {
  team: string
  person: string
  game: LogGame
  /** Our counters, where a row can say which was called. */
  calls: readonly Call[]
  /** The server's rows, as the page was given them. */
  rows: () => PossessionRow[]
  changed: (rows: PossessionRow[]) => void
}

/** Everything the log page does, put together: the line, what is on its way, pictures, and what was thrown away. */
export function useLog({ team, person, game, calls, rows: given, changed }: LogOptions) {
  const pack = rulePack(game.rulePack)
  const rows = shallowRef(given())
  watch(given, (now) => (rows.value = now))
  const put = (next: PossessionRow[]) => changed((rows.value = next))
  const putRow = (row: PossessionRow) => put(withRow(rows.value, row))

  const outbox = useOutbox({
    person,
    game: game.id,
    send: (id, body, version) => putPossession(team, id, body, version),
    sent: (row) => {
      putRow(row)
      void pictures.flush()
    },
  })
  const list = computed(() => logRows(rows.value, outbox.entries.value, outbox.sending.value))
  const pictures = usePictures({
    send: (possession, id, file, text, options) => putStill(team, possession, id, file, text, options),
    sent: (possession, still) => put(withStills(rows.value, possession, (stills) => [...stills, still])),
    hasRow: (possession) => rows.value.some((row) => row.id === possession),
    readSeconds: (text) => readSeconds(text, LIMITS.seconds),
  })
  const thrown = useThrownAway({
    person,
    game: game.id,
    outbox,
    remove: (id, version) => deletePossession(team, id, version),
    restore: (id) => restorePossession(team, id),
    gone: (id) => put(withoutRow(rows.value, id)),
    back: putRow,
  })
  const log = useLogLine({
    person,
    game,
    rows: list,
    save: (line, body) => {
      outbox.put(line.id, body, line.version)
      pictures.release(line.id)
    },
  })

  const { line } = log
  const answers = computed(() => answersOf(line.value, pack, calls))
  const typed = computed(() => typedOf(line.value.draft, line.value.open))
  const row = computed(() => list.value.find((each) => each.id === line.value.id) ?? null)
  const question = computed(() =>
    line.value.open === null ? 'What else was seen? This can be left out.' : questionOf(line.value.open).long,
  )
  /** What a reader hears after each answer. */
  const heard = ref('')

  function say(before: string): void {
    const whole = line.value.open === null && log.complete.value
    heard.value = whole
      ? `${textOf(sentenceOf(line.value, calls))} Enter saves it.`
      : [before, question.value].filter(Boolean).join(' ')
  }

  function act(what: Act): void {
    const answer = answers.value.find((each) => each.act === what)
    log.act(what)
    say(answer === undefined ? '' : `${answer.label}.`)
  }

  function save(): boolean {
    const number = log.save()
    if (number === null) return false
    const here = outbox.offline.value ? 'kept here' : 'saved'
    heard.value = `No. ${number} ${here}. No. ${line.value.draft.number}: ${question.value}`
    return true
  }

  function openRow(which: LogRow): void {
    log.openRow(which)
    heard.value = `No. ${which.draft.number} is open. ${textOf(sentenceOf(line.value, calls))}`
  }

  async function throwAway(): Promise<void> {
    const id = thrown.asked.value?.id
    if ((await thrown.throwAway()) && id === line.value.id) log.leaveRow()
  }

  const stillProblem = shallowRef<Error | null>(null)
  const busyStill = ref(false)
  /** A still goes at once and for good: it may show a minor. */
  async function throwStill(possession: string, still: StillRow): Promise<boolean> {
    busyStill.value = true
    stillProblem.value = null
    try {
      await deleteStill(team, possession, still.id)
      put(withStills(rows.value, possession, (stills) => stills.filter((each) => each.id !== still.id)))
      return true
    } catch (error) {
      stillProblem.value = error as Error
      return false
    } finally {
      busyStill.value = false
    }
  }

  const addPictures = (files: File[]) => pictures.add(line.value.id, files, row.value?.stills.length ?? 0)

  return {
    pack,
    outbox,
    list,
    pictures,
    thrown,
    ...log,
    answers,
    typed,
    row,
    question,
    heard,
    act,
    save,
    openRow,
    throwAway,
    stillProblem,
    busyStill,
    throwStill,
    addPictures,
  }
}
