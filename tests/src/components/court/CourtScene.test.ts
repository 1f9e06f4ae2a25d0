import { mount } from '@vue/test-utils'
import { afterEach, describe, expect, it, vi } from 'vitest'
import CourtScene from '@/components/court/CourtScene.vue'
import { pointInView } from '@/components/court/pointInView'
import { counterScene } from '@shared/court/counterScene'
import { toMetres } from '@shared/court/frame'
import { pressScene } from '@shared/court/pressScene'
import { rulePack } from '@shared/court/rulePacks'
import { placeOfPoint, trapTapScene } from '@shared/court/trapTapScene'
import { SPOT_CELLS, spotAt } from '@shared/court/trapSpots'
import { ACROSS } from '../../../shared/court/diagrams'

const pack = rulePack('fiba')

afterEach(() => vi.restoreAllMocks())

/** jsdom lays nothing out: says where the drawing stands on the page. */
function standsAt(box: { left: number; top: number; width: number; height: number }): void {
  vi.spyOn(SVGElement.prototype, 'getBoundingClientRect').mockReturnValue({
    ...box,
    x: box.left,
    y: box.top,
  } as DOMRect)
}

describe('CourtScene', () => {
  it('is one picture with its description as text', () => {
    const scene = counterScene({ diagram: ACROSS, pack, pxPerMetre: 27, step: 1 })
    const svg = mount(CourtScene, { props: { scene } }).get('svg')
    expect(svg.attributes('role')).toBe('img')
    expect(svg.attributes('aria-label')).toBe(scene.description)
    expect(svg.findAll('[tabindex]')).toHaveLength(0)
  })

  it('draws every node of the scene, inks as variables', () => {
    const scene = counterScene({ diagram: ACROSS, pack, pxPerMetre: 27, step: 1 })
    const svg = mount(CourtScene, { props: { scene } }).get('svg')
    expect(svg.get('[data-part="token-1"] text').text()).toBe('1')
    expect(svg.get('[data-part="token-1"]').html()).toContain('var(--our)')
    expect(svg.get('[data-part="theirs-X1"]').html()).toContain('var(--their)')
  })

  it('sets type far above one unit, so that no browser rounds it away', () => {
    const scene = counterScene({ diagram: ACROSS, pack, pxPerMetre: 27, step: 1 })
    const sizes = mount(CourtScene, { props: { scene } })
      .findAll('text')
      .map((text) => Number(text.attributes('font-size')))
    expect(Math.min(...sizes)).toBeGreaterThan(10)
  })

  it('tells a tap in metres', async () => {
    const scene = trapTapScene(pack, 26)
    standsAt({ left: 100, top: 50, width: scene.view.width * 10, height: scene.view.height * 10 })
    const wrapper = mount(CourtScene, { props: { scene, tappable: true } })
    await wrapper.get('svg').trigger('click', {
      detail: 1,
      clientX: 100 + (2 - scene.view.x) * 10,
      clientY: 50 + (14 - scene.view.y) * 10,
    })
    const [[point]] = wrapper.emitted('place') as [[{ x: number; y: number }]]
    expect(point.x).toBeCloseTo(2, 6)
    expect(point.y).toBeCloseTo(14, 6)
    expect(spotAt(placeOfPoint(pack, point))).toEqual({ spot: 'coffin-corner', side: 'right' })
  })

  it('can be tapped by key: each spot is a button that gives its own middle', async () => {
    const wrapper = mount(CourtScene, { props: { scene: trapTapScene(pack), tappable: true } })
    const buttons = wrapper.findAll('[role="button"]')
    expect(buttons).toHaveLength(SPOT_CELLS.length)
    expect(buttons.every((button) => (button.attributes('aria-label') ?? '') !== '')).toBe(true)
    for (const [i, cell] of SPOT_CELLS.entries()) {
      await buttons[i]!.trigger('keydown', { key: 'Enter' })
      const events = wrapper.emitted('place') as [{ x: number; y: number }][]
      expect(spotAt(placeOfPoint(pack, events[i]![0]))).toEqual({ spot: cell.spot, side: cell.side })
    }
  })

  it('stays silent when it is not to be tapped', async () => {
    const wrapper = mount(CourtScene, { props: { scene: trapTapScene(pack) } })
    await wrapper.get('svg').trigger('click', { detail: 1, clientX: 10, clientY: 10 })
    expect(wrapper.emitted('place')).toBeUndefined()
  })

  it('lets a zone be picked by pointer and by key', async () => {
    const scene = pressScene({
      pack,
      pxPerMetre: 27,
      zones: [{ spot: 'coffin-corner', side: 'right', k: 5, n: 11, thin: false }],
    })
    const id = 'trap-zone-coffin-corner-right'
    const wrapper = mount(CourtScene, { props: { scene, pickable: [id] } })
    const zone = wrapper.get('[role="button"]')
    expect(zone.attributes('aria-label')).toBe('right deep corner: 5 of 11')
    await zone.trigger('click', { detail: 1 })
    await zone.trigger('keydown', { key: ' ' })
    expect(wrapper.emitted('pick')).toEqual([[id], [id]])
    expect(wrapper.emitted('place')).toBeUndefined()
  })
})

describe('pointInView', () => {
  it('knows the bands beside a drawing that does not fill its place', () => {
    const view = { x: -1, y: -1, width: 30, height: 17 }
    const shown = { left: 0, top: 0, width: 300, height: 300 }
    const at = toMetres(pack, { x: 0.5, y: 0.5 })
    const top = (300 - 170) / 2
    const point = pointInView(view, shown, (at.x + 1) * 10, top + (at.y + 1) * 10)
    expect(point.x).toBeCloseTo(at.x, 9)
    expect(point.y).toBeCloseTo(at.y, 9)
  })
})
