import { describe, expect, it } from 'vitest'
import { LIMITS } from '@shared/limits'
import { renderNotes } from '@/components/notes/renderNotes'

function html(text: string): string {
  const place = document.createElement('div')
  place.append(renderNotes(text))
  return place.innerHTML
}
function elements(text: string): Element[] {
  const place = document.createElement('div')
  place.append(renderNotes(text))
  return [...place.querySelectorAll('*')]
}

describe('a note as it reads', () => {
  it('has headings below the page’s own, lists, strong words and lines as they were typed', () => {
    expect(html('# Press\n\n- **12** jumps\n- waits')).toContain('<h3>Press</h3>')
    expect(html('###### deep')).toBe('<h5>deep</h5>')
    expect(html('- **12** jumps')).toContain('<li><strong>12</strong> jumps</li>')
    expect(html('one\ntwo')).toContain('one<br>two')
  })

  it('opens other sites apart and tells them nothing; our own pages open here', () => {
    const [, link] = elements('[film](https://film.example/a)')
    expect(link?.outerHTML).toBe(
      '<a href="https://film.example/a" target="_blank" rel="noopener noreferrer nofollow">film</a>',
    )
    expect(html('[squad](/t/1/squad)')).toContain('<a href="/t/1/squad">squad</a>')
  })
})

describe('hostile notes', () => {
  const HOSTILE = [
    '<script>alert(1)</script>',
    '<img src=x onerror=alert(1)>',
    '![x](x" onerror="alert(1))',
    '![x](javascript:alert(1))',
    '[x](javascript:alert(1))',
    '[x](JaVaScRiPt:alert(1))',
    '[x](  javascript:alert(1))',
    '[x](&#106;avascript:alert(1))',
    '[x](java&#x0A;script:alert(1))',
    '[x](data:text/html;base64,PHNjcmlwdD4=)',
    '[x](vbscript:msgbox)',
    '[x](//elsewhere.example)',
    '[x](/\\\\elsewhere.example)',
    '<javascript:alert(1)>',
    '[x](https://a.example "onmouseover=alert(1)")',
    '<svg><script>alert(1)</script></svg>',
    '<svg onload=alert(1)>',
    '<math><mtext><table><mglyph><style><img src=x onerror=alert(1)>',
    '<iframe srcdoc="<script>alert(1)</script>"></iframe>',
    '<a href="javascript:alert(1)" onclick="alert(1)">x</a>',
    '<style>*{display:none}</style>',
    '<form action="/api/session"><input name=a></form>',
    '```html\n<img src=x onerror=alert(1)>\n```',
    '<p style="position:fixed" id="page" class="skip-link">x</p>',
    '# <img src=x onerror=alert(1)>',
    '| a |\n| - |\n| <img src=x onerror=alert(1)> |',
  ]
  const ATTRIBUTES = ['href', 'target', 'rel', 'start']
  const TAGS =
    'P BR STRONG EM DEL UL OL LI H3 H4 H5 BLOCKQUOTE CODE PRE A HR TABLE THEAD TBODY TR TH TD'.split(' ')

  it.each(HOSTILE)('%s becomes words', (text) => {
    for (const element of elements(text)) {
      expect(TAGS).toContain(element.tagName)
      for (const { name } of element.attributes) expect(ATTRIBUTES).toContain(name)
      const address = element.getAttribute('href')
      if (address !== null) expect(address).toMatch(/^(https?:\/\/|mailto:|\/(?![/\\]))/)
    }
  })

  it('are shown as they were typed, not swallowed', () => {
    expect(html('<img src=x onerror=alert(1)>')).toContain('&lt;img src=x onerror=alert(1)&gt;')
    expect(html('[the film](javascript:alert(1))')).toContain('the film')
  })

  it('do not nest without end, and are not lost when they try', () => {
    const deep = html(`${'> '.repeat(3000)}at the bottom`)
    expect(deep).toContain('at the bottom')
    expect(deep.match(/<blockquote>/g)?.length).toBe(6)
    for (const part of ['- ', '1. ', '[', '*a _b ']) expect(html(part.repeat(2000))).not.toBe('')
  }, 30_000)

  it('as long as a note may be are read in a moment', () => {
    const began = performance.now()
    for (const part of ['[', '*a ', '> ', '<a>', '`', '- x\n', '# x\n'])
      renderNotes(part.repeat(LIMITS.notes).slice(0, LIMITS.notes))
    expect(performance.now() - began).toBeLessThan(20_000)
  }, 30_000)
})
