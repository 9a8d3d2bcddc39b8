import { request } from 'node:http'
import { afterEach, describe, expect, it } from 'vitest'
import { startMailFake, type MailFake } from '#server/mail/fake/start'
import { writeLetter } from '#server/mail/letter'
import { createMailer } from '#server/mail/mailer'

let fake: MailFake | undefined
afterEach(async () => {
  await fake?.stop()
  fake = undefined
})

async function sendOne(fakeMail: MailFake, subject = 'A subject') {
  const mailer = createMailer({ SMTP_URL: fakeMail.smtpUrl, MAIL_FROM: 'Pintle <no-reply@pintle.invalid>' })
  await mailer.send(
    writeLetter({
      to: 'someone@example.test',
      subject,
      before: ['Hello <script>alert(1)</script> & friends,'],
      link: { label: 'Open "it"', url: 'https://pintle.example.test/x#token=a&b' },
      after: ['Ünïcode goes through.'],
    }),
  )
  mailer.close()
}

const get = (url: string, host: string) =>
  new Promise<number>((resolve, reject) => {
    request(url, { headers: { host } }, (response) => {
      response.resume()
      resolve(response.statusCode ?? 0)
    })
      .on('error', reject)
      .end()
  })

describe('a mail', () => {
  it('goes out over SMTP in both forms, with what people typed escaped in the HTML', async () => {
    fake = await startMailFake()
    await sendOne(fake)
    const [mail] = fake.inbox.list()
    expect(mail).toMatchObject({ to: 'someone@example.test', subject: 'A subject' })
    expect(mail?.text).toContain('Hello <script>alert(1)</script> & friends,')
    expect(mail?.text).toContain('https://pintle.example.test/x#token=a&b')
    expect(mail?.text).toContain('Ünïcode goes through.')
    expect(mail?.html).toContain('Hello &lt;script&gt;alert(1)&lt;/script&gt; &amp; friends,')
    expect(mail?.html).toContain('href="https://pintle.example.test/x#token=a&amp;b"')
  })
})

describe('the page of kept mails', () => {
  it('lists them newest first and shows one with its link, without running anything in it', async () => {
    fake = await startMailFake()
    await sendOne(fake, 'First')
    await sendOne(fake, 'Second <b>')
    const list = await fetch(fake.pageUrl)
    const text = await list.text()
    expect(text.indexOf('Second &lt;b&gt;')).toBeLessThan(text.indexOf('First'))
    expect(text).toMatch(/Second/)
    const one = await fetch(new URL('/mails/2', fake.pageUrl))
    const page = await one.text()
    expect(page).toContain('<a href="https://pintle.example.test/x#token=a&amp;b"')
    expect(page).not.toContain('<script>alert')
    for (const { headers } of [list, one]) {
      expect(headers.get('content-security-policy')).toMatch(/default-src 'none'; style-src 'sha256-/)
      expect(headers.get('x-content-type-options')).toBe('nosniff')
    }
  })

  it('says so when there is no such mail, and when there is none at all', async () => {
    fake = await startMailFake()
    expect(await (await fetch(fake.pageUrl)).text()).toContain('Nothing was sent yet.')
    expect((await fetch(new URL('/mails/7', fake.pageUrl))).status).toBe(404)
    expect((await fetch(new URL('/elsewhere', fake.pageUrl))).status).toBe(404)
    expect((await fetch(fake.pageUrl, { method: 'POST' })).status).toBe(404)
  })

  it('answers to this machine’s names only', async () => {
    fake = await startMailFake()
    expect(await get(fake.pageUrl, 'elsewhere.example.test')).toBe(403)
    expect(await get(fake.pageUrl, 'localhost:1234')).toBe(200)
  })

  it('keeps the hundred newest', async () => {
    fake = await startMailFake()
    for (let id = 1; id <= 101; id += 1)
      fake.inbox.add({ receivedAt: new Date(), to: '', subject: `${id}`, text: '', html: '' })
    expect(fake.inbox.list()).toHaveLength(100)
    expect(fake.inbox.find(1)).toBeUndefined()
    expect(fake.inbox.find(101)?.subject).toBe('101')
  })
})
