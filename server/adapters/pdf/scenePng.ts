import sharp from 'sharp'
import type { PathNode, Scene, SceneNode, TextNode } from '@shared/court/scene'
import { PRINT_INKS } from './printInks'

/**
 * A scene as a PNG at twice the width it will be shown at, for a letter. Its type falls back to what the
 * server has, so that a letter's drawing carries letters and counts only.
 * @param width CSS px that it is shown at
 */
export function scenePng(scene: Scene, width: number): Promise<Buffer> {
  const { x, y, width: metres, height } = scene.view
  const px = width * 2
  const svg = `<svg xmlns="http://www.w3.org/2000/svg" width="${px}" height="${Math.round((px * height) / metres)}" viewBox="${x} ${y} ${metres} ${height}"><rect x="${x}" y="${y}" width="${metres}" height="${height}" fill="#ffffff"/>${scene.nodes.map(svgOf).join('')}</svg>`
  return sharp(Buffer.from(svg)).png({ palette: true }).toBuffer()
}

const svgOf = (node: SceneNode): string =>
  node.kind === 'group' ? node.nodes.map(svgOf).join('') : node.kind === 'path' ? pathOf(node) : textOf(node)

const attributes = (values: Record<string, string | number | undefined>): string =>
  Object.entries(values)
    .filter(([, value]) => value !== undefined)
    .map(([name, value]) => ` ${name}="${value}"`)
    .join('')

const pathOf = (node: PathNode): string =>
  `<path${attributes({
    d: node.d,
    fill: node.fill ? PRINT_INKS[node.fill] : 'none',
    'fill-opacity': node.fillOpacity,
    stroke: node.stroke ? PRINT_INKS[node.stroke] : undefined,
    'stroke-width': node.strokeWidth,
    'stroke-opacity': node.strokeOpacity,
    'stroke-dasharray': node.dash?.join(' '),
    'stroke-linecap': node.cap,
    'stroke-linejoin': node.join,
  })}/>`

function textOf(node: TextNode): string {
  const place = {
    x: node.x,
    y: node.y,
    'font-family': 'Archivo Narrow, Arial Narrow, Arial, Liberation Sans, sans-serif',
    'font-size': node.size,
    'font-weight': node.weight,
    'text-anchor': node.anchor,
  }
  const words = node.text.replace(/&/g, '&amp;').replace(/</g, '&lt;')
  const halo = node.halo
    ? `<text${attributes({ ...place, fill: 'none', stroke: PRINT_INKS[node.halo.ink], 'stroke-width': node.halo.width, 'stroke-linejoin': 'round' })}>${words}</text>`
    : ''
  return `${halo}<text${attributes({ ...place, fill: PRINT_INKS[node.ink] })}>${words}</text>`
}
