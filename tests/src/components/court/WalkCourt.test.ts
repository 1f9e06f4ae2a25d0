import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest'
import { nextTick } from 'vue'
import { mount, type VueWrapper } from '@vue/test-utils'
import { rulePack } from '@shared/court/rulePacks'
import { standingAt } from '@shared/court/walk/standing'
import { timeline } from '@shared/court/walk/timeline'
import { DEMO_COUNTERS } from '@server/database/demo/counters'
import { CounterBody } from '@shared/counters/schemas'
import WalkCourt from '@/components/court/WalkCourt.vue'

const { diagram } = CounterBody.parse(DEMO_COUNTERS[0])
const pack = rulePack('fiba')
const whole = timeline(diagram, pack)

function reducedMotion(asked: boolean): void {
  vi.stubGlobal('matchMedia', (query: string) => ({
    matches: asked && query.includes('reduce'),
    media: query,
    addEventListener: () => undefined,
    removeEventListener: () => undefined,
  }))
}

/** The browser's frames, in our hand: each is 200 ms long. */
const FRAME = 200
let waiting: FrameRequestCallback[] = []
let clock = 0
beforeEach(() => {
  waiting = []
  clock = 1000
  vi.stubGlobal('requestAnimationFrame', (then: FrameRequestCallback) => waiting.push(then))
  vi.stubGlobal('cancelAnimationFrame', () => (waiting = []))
})
afterEach(() => vi.unstubAllGlobals())

async function pass(ms: number): Promise<void> {
  for (let gone = 0; gone < ms; gone += FRAME) {
    clock += FRAME
    for (const then of waiting.splice(0)) then(clock)
    await nextTick()
  }
}
/** The first frame after a start only sets the clock. */
const begin = () => pass(FRAME)

function open(more: Record<string, unknown> = {}): VueWrapper {
  const page = mount(WalkCourt, {
    attachTo: document.body,
    props: {
      diagram,
      pack,
      step: 0,
      keys: true,
      'onUpdate:step': (step: number) => void page.setProps({ step }),
      ...more,
    },
  })
  return page
}
const now = (page: VueWrapper) => Number(page.get('[role=slider]').attributes('aria-valuenow'))
const words = (page: VueWrapper) => page.get('[role=slider]').attributes('aria-valuetext') ?? ''
const button = (page: VueWrapper, name: string) =>
  page.findAll('button').find((one) => one.text() === name) ?? expect.fail(`no button ${name}`)
const space = (target: EventTarget = document.body) =>
  target.dispatchEvent(new KeyboardEvent('keydown', { key: ' ', bubbles: true, cancelable: true }))

describe('a counter that is walked', () => {
  it('goes at the real count by Space, is held by Space, and then at half of it', async () => {
    const page = open()
    space()
    await begin()
    await pass(1000)
    expect(now(page)).toBe(1)
    space()
    await pass(1000)
    expect(now(page)).toBe(1)
    await button(page, 'Half speed').trigger('click')
    await button(page, 'Walk it').trigger('click')
    await begin()
    await pass(1000)
    expect(now(page)).toBe(1.5)
    page.unmount()
  })

  it('turns the steps as it comes to them, ends at the end, says so once, and starts again', async () => {
    const page = open()
    space()
    await begin()
    await pass((whole.duration + 1) * 1000)
    expect(now(page)).toBeCloseTo(whole.duration, 1)
    expect(page.props('step' as never)).toBe(diagram.steps.length - 1)
    expect(page.emitted('walked')).toHaveLength(1)
    await button(page, 'Walk it again').trigger('click')
    await begin()
    await pass(200)
    expect(now(page)).toBeLessThan(0.5)
    page.unmount()
  })

  it('leaves Space to a button that has the focus', () => {
    const page = open()
    space(page.get('.station').element)
    expect(page.text()).toContain('Walk it')
    page.unmount()
  })

  it('is scrubbed by keys: tenths, seconds, steps, both ends, and says where it is', async () => {
    const page = open()
    const slider = page.get('[role=slider]')
    const key = (name: string, more = {}) => slider.trigger('keydown', { key: name, ...more })
    await key('ArrowRight')
    expect(now(page)).toBe(0.1)
    await key('ArrowRight', { shiftKey: true })
    expect(now(page)).toBe(1.1)
    expect(words(page)).toContain('Throw-in, 3.9 s left of 5')
    await key('End')
    expect(now(page)).toBeCloseTo(whole.duration, 1)
    expect(words(page)).toContain('Over half')
    await key('Home')
    expect(now(page)).toBe(0)
    await key('PageUp')
    await key('PageUp')
    expect(page.props('step' as never)).toBe(2)
    await key('ArrowRight')
    expect(words(page)).toMatch(/after the first touch, step 3, Backcourt, 7\.\d s left of 8/)
    page.unmount()
  })

  it('shows a still of the step that is chosen, and follows a step from outside', async () => {
    const page = open()
    await page.findAll('.station')[3]?.trigger('click')
    expect(page.props('step' as never)).toBe(3)
    expect(now(page)).toBeCloseTo(whole.steps[3]?.start ?? 0, 1)
    expect(page.find('[aria-current=step]').text()).toContain('4')
    await page.setProps({ step: 1 })
    expect(now(page)).toBeCloseTo(whole.steps[1]?.start ?? 0, 1)
    page.unmount()
  })

  it('draws what stands still once a step: only players and ball are drawn anew at a frame', async () => {
    const page = open()
    await page.get('[role=slider]').trigger('keydown', { key: 'ArrowRight', shiftKey: true })
    const parts = () => page.findAll('.layers svg').map((svg) => svg.html())
    const before = parts()
    await page.get('[role=slider]').trigger('keydown', { key: 'ArrowRight' })
    const after = parts()
    expect(after[0]).toBe(before[0])
    expect(after[1]).not.toBe(before[1])
    const ball = standingAt(whole, now(page)).ball
    expect(ball.holder).toBe(diagram.start.ball)
    page.unmount()
  })
})

describe('with little motion', () => {
  it('never runs: each press of Space is the next still, the last one the end', async () => {
    reducedMotion(true)
    const page = open()
    expect(page.text()).not.toContain('Half speed')
    const seen: number[] = []
    for (let press = 0; press < diagram.steps.length; press += 1) {
      space()
      await pass(1000)
      seen.push(now(page))
    }
    const stills = [...whole.steps.slice(1).map(({ start }) => start), whole.duration]
    stills.forEach((still, index) => expect(seen[index]).toBeCloseTo(still, 1))
    expect(page.emitted('walked')).toHaveLength(1)
    expect(page.text()).toContain('Back to the start')
    page.unmount()
  })
})
