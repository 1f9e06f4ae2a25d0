import { BookQuery } from '@shared/counters/book'
import type { Context } from '../../context'
import { endpoint } from '../../http/endpoint'
import { InTeam } from '../../http/params'
import { sendPdf } from '../sheets/drawSheet'
import { printBook } from './book.service'

export const bookRoutes = ({ db }: Context) => [
  endpoint({
    method: 'get',
    path: '/teams/:team/book.pdf',
    summary: 'The printed book of counters, one page each; some of them when they are named',
    action: 'counter:read',
    params: InTeam,
    query: BookQuery,
    media: { response: 'application/pdf' },
    problems: { 409: 'There is no counter to print' },
    handle: async ({ caller, query, res }) =>
      sendPdf(res, 'book.pdf', await printBook(db.manager, caller.teamId, query)),
  }),
]
