/** A mail that the fake took in. */
export interface KeptMail {
  id: number
  receivedAt: Date
  to: string
  subject: string
  text: string
  html: string
}

const MOST = 100

/** The newest mails, in memory only: they hold names and links that should not outlive the process. */
export class Inbox {
  private readonly mails: KeptMail[] = []
  private lastId = 0

  add(mail: Omit<KeptMail, 'id'>): void {
    this.lastId += 1
    this.mails.unshift({ id: this.lastId, ...mail })
    this.mails.length = Math.min(this.mails.length, MOST)
  }

  list(): readonly KeptMail[] {
    return this.mails
  }

  find(id: number): KeptMail | undefined {
    return this.mails.find((mail) => mail.id === id)
  }
}
