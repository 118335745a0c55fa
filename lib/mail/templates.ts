/** A message before it has an addressee. Plain text: it reads the same everywhere. */
export interface MailText {
  readonly kind: 'invitation' | 'passwordReset' | 'order';
  readonly subject: string;
  readonly text: string;
}

function paragraphs(...parts: readonly (string | null)[]): string {
  return `${parts.filter((part) => part !== null).join('\n\n')}\n`;
}

export function invitationMail(facts: {
  readonly companyName: string;
  readonly invitedBy: string;
  readonly name: string;
  readonly role: string;
  readonly link: string;
  readonly days: number;
}): MailText {
  return {
    kind: 'invitation',
    subject: `${facts.companyName} invites you to Strikeoff`,
    text: paragraphs(
      `Hello ${facts.name},`,
      `${facts.invitedBy} invites you to ${facts.companyName}'s Strikeoff as ${facts.role}. ` +
        'Choose a password here:',
      facts.link,
      `The link works once, for ${facts.days} days. If you did not expect this message, ` +
        'leave it unanswered and nothing happens.',
    ),
  };
}

export function passwordResetMail(facts: {
  readonly name: string;
  readonly link: string;
  readonly minutes: number;
}): MailText {
  return {
    kind: 'passwordReset',
    subject: 'Choose a new Strikeoff password',
    text: paragraphs(
      `Hello ${facts.name},`,
      'Someone asked for a new password for your account. If it was you, choose one here:',
      facts.link,
      `The link works once, for ${facts.minutes} minutes. If it was not you, leave this ` +
        'message unanswered: your password stays as it is.',
    ),
  };
}

/** An order as the dispatcher needs it: what, where, when, and whom to call. */
export function orderMail(facts: {
  readonly companyName: string;
  readonly orderNumber: string;
  /** 1 for the first sending; later ones say that they replace it. */
  readonly version: number;
  readonly supplierName: string;
  readonly jobName: string;
  readonly jobAddress: string;
  /** "Tuesday, 14 Jun 2026" */
  readonly pourDay: string;
  /** "6:30 am", or null where only the day is agreed. */
  readonly firstTruck: string | null;
  readonly spacingMinutes: number | null;
  /** "42.00 yd³ of 4000AE, 4000 psi air-entrained" */
  readonly lines: readonly string[];
  readonly notes: string;
  readonly orderedBy: string;
  readonly answerTo: string;
}): MailText {
  const revised = facts.version > 1;
  return {
    kind: 'order',
    subject: `${revised ? 'Changed order' : 'Order'} ${facts.orderNumber} for ${facts.pourDay}, ${facts.companyName}`,
    text: paragraphs(
      `To ${facts.supplierName}, dispatch`,
      revised
        ? `This replaces what we sent before for order ${facts.orderNumber}.`
        : `Please deliver our order ${facts.orderNumber}.`,
      [
        `Job: ${facts.jobName}`,
        facts.jobAddress ? `Address: ${facts.jobAddress}` : null,
        `Day: ${facts.pourDay}`,
        facts.firstTruck ? `First truck on site: ${facts.firstTruck}` : null,
        facts.spacingMinutes ? `Truck spacing: ${facts.spacingMinutes} minutes` : null,
      ]
        .filter((line) => line !== null)
        .join('\n'),
      facts.lines.map((line) => `  - ${line}`).join('\n'),
      facts.notes ? `Notes: ${facts.notes}` : null,
      `Please confirm to ${facts.answerTo}, with your own order number.`,
      `${facts.orderedBy}\n${facts.companyName}`,
    ),
  };
}

/** Tells dispatch that an order they were sent is off. */
export function cancelledOrderMail(facts: {
  readonly companyName: string;
  readonly orderNumber: string;
  readonly supplierName: string;
  readonly jobName: string;
  readonly pourDay: string;
  readonly reason: string;
  readonly cancelledBy: string;
  readonly answerTo: string;
}): MailText {
  return {
    kind: 'order',
    subject: `Cancelled: order ${facts.orderNumber} for ${facts.pourDay}, ${facts.companyName}`,
    text: paragraphs(
      `To ${facts.supplierName}, dispatch`,
      `Please cancel our order ${facts.orderNumber} for ${facts.jobName} on ${facts.pourDay}.`,
      `Reason: ${facts.reason}`,
      `Questions to ${facts.answerTo}.`,
      `${facts.cancelledBy}\n${facts.companyName}`,
    ),
  };
}
