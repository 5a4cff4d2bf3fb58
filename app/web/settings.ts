/** The settings of an installation, read from the environment and checked by the start command. */
export interface Settings {
  port: number
  host: string
  appUrl: string
  dataDir: string
  databaseUrl: string
  smtpUrl: string
  mailFrom: string
  photoDir: string
  appSecret: string
  trustProxy: string | number | boolean
  operatorEmail: string | null
  clockAt: string | null
  groundFile: string
  /** demo accounts, fakes and the inbox page: on a loopback address only */
  demo: boolean
  production: boolean
}
