import { createHmac, timingSafeEqual } from 'node:crypto'
import { isUuid } from '~/lib/uuid'
import type { Settings } from '~/web/settings'

/** Where the mails of reports point: the product's address, and the secret that opens one report's private page. */
export interface ReportLinks {
  appUrl: string
  toStatusSecret: (reportId: string) => string
}

const sign = (reportId: string, appSecret: string) =>
  createHmac('sha256', appSecret).update(`report-status ${reportId}`).digest()

/**
 * Links to reports. The secret names its report and is signed with the installation's secret, not stored: a report
 * sent twice gives the same page, and every mail about it the same link.
 */
export function toReportLinks({ appUrl, appSecret }: Pick<Settings, 'appUrl' | 'appSecret'>): ReportLinks {
  return {
    appUrl,
    toStatusSecret: reportId => `${reportId}.${sign(reportId, appSecret).toString('base64url')}`,
  }
}

/** The report a private link names, or null when the link is not whole or not ours. */
export function findLinkedReport(secret: string, appSecret: string): string | null {
  const [reportId = '', signature = ''] = secret.split('.')
  if (!isUuid(reportId)) return null
  const given = Buffer.from(signature, 'base64url')
  const right = sign(reportId, appSecret)
  return given.length === right.length && timingSafeEqual(given, right) ? reportId : null
}
