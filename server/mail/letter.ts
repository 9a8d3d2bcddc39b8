import type { Letter } from './mailer'

const ENTITIES: Record<string, string> = { '&': '&amp;', '<': '&lt;', '>': '&gt;', '"': '&quot;', "'": '&#39;' }
export const escapeHtml = (text: string): string => text.replace(/[&<>"']/g, (character) => ENTITIES[character] ?? '')

interface Draft {
  to: string
  subject: string
  /** Paragraphs above and below the link. */
  before: string[]
  link: { label: string; url: string }
  after: string[]
}

const paragraph = (text: string) => `<p style="margin:0 0 16px">${escapeHtml(text)}</p>`

/** One draft, two forms: mail programs that show no HTML get the same words. */
export function writeLetter({ to, subject, before, link, after }: Draft): Letter {
  const text = [...before, `${link.label}:\n${link.url}`, ...after, 'Pintle'].join('\n\n') + '\n'
  const html = [
    '<!doctype html><html lang="en"><head><meta charset="utf-8">',
    `<title>${escapeHtml(subject)}</title></head>`,
    '<body style="margin:0;padding:24px;background:#FAF7F2;color:#1E2226;font:16px/1.5 sans-serif">',
    '<div style="max-width:560px;margin:0 auto">',
    ...before.map(paragraph),
    `<p style="margin:0 0 16px"><a style="color:#33506B" href="${escapeHtml(link.url)}">${escapeHtml(link.label)}</a></p>`,
    ...after.map(paragraph),
    '<p style="margin:0">Pintle</p></div></body></html>',
  ].join('\n')
  return { to, subject, text, html }
}
