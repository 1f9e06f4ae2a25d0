import DOMPurify from 'dompurify'
import { Marked, type Tokens } from 'marked'

const escaped = (text: string): string =>
  text.replace(/&/g, '&amp;').replace(/</g, '&lt;').replace(/>/g, '&gt;').replace(/"/g, '&quot;')

/** Headings of a note stand below the page's own: its first level is our third. */
const LOWERED = 2
const DEEPEST = 5

/** Markup typed into a note is shown as it was typed; a picture is its words. */
const markdown = new Marked({
  gfm: true,
  breaks: true,
  renderer: {
    html: ({ text }: Tokens.HTML | Tokens.Tag) => escaped(text),
    image: ({ text, href }: Tokens.Image) => escaped(text || href),
    heading({ tokens, depth }: Tokens.Heading) {
      const level = Math.min(depth + LOWERED, DEEPEST)
      return `<h${level}>${this.parser.parseInline(tokens)}</h${level}>`
    },
    checkbox: ({ checked }: Tokens.Checkbox) => (checked ? '&#x2713; ' : '&#x25CB; '),
  },
})

const TAGS = 'p br strong em del ul ol li h3 h4 h5 blockquote code pre a hr table thead tbody tr th td'.split(
  ' ',
)
/** Other sites, letters and our own pages; nothing that runs. */
const ADDRESS = /^(?:https?:\/\/|mailto:|\/(?![/\\]))/i

/** Quotes in quotes past the sixth are the sixth: thousands of them would be walked one inside the other. */
const TOO_DEEP = /^(?:[ \t]*>){7,}/gm
const DEEP = '>'.repeat(6)

/**
 * The Markdown of a note as elements to put into the page: cleaned, without pictures, scripts or styles. Links to
 * other sites open apart and tell them nothing; a link that leads nowhere safe is its words.
 */
export function renderNotes(text: string): DocumentFragment {
  try {
    return rendered(text.replace(TOO_DEEP, DEEP))
  } catch {
    // Nested past what can be walked: it still reads as it was typed.
    const fragment = document.createDocumentFragment()
    const plain = fragment.appendChild(document.createElement('pre'))
    plain.textContent = text
    return fragment
  }
}

function rendered(text: string): DocumentFragment {
  const fragment = DOMPurify.sanitize(markdown.parse(text, { async: false }), {
    RETURN_DOM_FRAGMENT: true,
    ALLOWED_TAGS: TAGS,
    ALLOWED_ATTR: ['href', 'start'],
    ALLOWED_URI_REGEXP: ADDRESS,
    ALLOW_DATA_ATTR: false,
    ALLOW_ARIA_ATTR: false,
  })
  for (const link of fragment.querySelectorAll('a')) {
    const address = link.getAttribute('href')
    if (address === null || !ADDRESS.test(address)) {
      link.replaceWith(...link.childNodes)
      continue
    }
    if (address.startsWith('/')) continue
    link.setAttribute('target', '_blank')
    link.setAttribute('rel', 'noopener noreferrer nofollow')
  }
  return fragment
}
