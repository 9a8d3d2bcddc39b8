import { createHash } from 'node:crypto'
import { createServer, type IncomingMessage, type Server, type ServerResponse } from 'node:http'
import { escapeHtml } from '../letter'
import type { Inbox, KeptMail } from './inbox'

const STYLE =
  'body{margin:0;padding:24px;background:#FAF7F2;color:#1E2226;font:16px/1.5 sans-serif}main{max-width:720px;margin:0 auto}' +
  'a{color:#33506B}pre{white-space:pre-wrap;overflow-wrap:anywhere;background:#fff;border:1px solid #DDD6CA;padding:16px;font:inherit}'
const STYLE_HASH = createHash('sha256').update(STYLE).digest('base64')

const document = (title: string, content: string) =>
  `<!doctype html><html lang="en"><head><meta charset="utf-8"><meta name="viewport" content="width=device-width">` +
  `<title>${escapeHtml(title)}</title><style>${STYLE}</style></head><body><main><h1>${escapeHtml(title)}</h1>${content}</main></body></html>`

const line = (mail: KeptMail) =>
  `<li><a href="/mails/${mail.id}">${escapeHtml(mail.subject)}</a> to ${escapeHtml(mail.to)}, ${mail.receivedAt.toISOString()}</li>`

function listPage(inbox: Inbox): string {
  const mails = inbox.list()
  const body = mails.length === 0 ? '<p>Nothing was sent yet.</p>' : `<ul>${mails.map(line).join('')}</ul>`
  return document(
    'Mails sent by this server',
    `${body}<p>Kept in memory until the server stops. Reload to see newer ones.</p>`,
  )
}

const withLinks = (text: string) =>
  escapeHtml(text).replace(/https?:\/\/[^\s<]+/g, (url) => `<a href="${url}" rel="noreferrer">${url}</a>`)

const mailPage = (mail: KeptMail) =>
  document(
    mail.subject,
    `<p>To ${escapeHtml(mail.to)}, ${mail.receivedAt.toISOString()}</p><pre>${withLinks(mail.text)}</pre><p><a href="/">All mails</a></p>`,
  )

function respond(inbox: Inbox, request: IncomingMessage, response: ServerResponse): void {
  response.setHeader(
    'Content-Security-Policy',
    `default-src 'none'; style-src 'sha256-${STYLE_HASH}'; base-uri 'none'; form-action 'none'; frame-ancestors 'none'`,
  )
  response.setHeader('Content-Type', 'text/html; charset=utf-8')
  response.setHeader('X-Content-Type-Options', 'nosniff')
  response.setHeader('Referrer-Policy', 'no-referrer')
  response.setHeader('Cache-Control', 'no-store')
  // A page elsewhere could point a name of its own at this machine; it would then call with that name.
  const host = (request.headers.host ?? '').replace(/:\d+$/, '')
  if (host !== '127.0.0.1' && host !== 'localhost') {
    response.writeHead(403).end(document('Not here', '<p>This page is read on this machine only.</p>'))
    return
  }
  const path = (request.url ?? '/').split('?')[0] ?? '/'
  const id = /^\/mails\/(\d{1,9})$/.exec(path)?.[1]
  const mail = id === undefined ? undefined : inbox.find(Number(id))
  if (request.method !== 'GET' || (path !== '/' && mail === undefined)) {
    response.writeHead(404).end(document('Not found', '<p>No such mail. <a href="/">All mails</a></p>'))
    return
  }
  response.end(mail === undefined ? listPage(inbox) : mailPage(mail))
}

/** A plain page on which the kept mails are read. The caller listens and closes. */
export const createMailPage = (inbox: Inbox): Server =>
  createServer((request, response) => respond(inbox, request, response))
