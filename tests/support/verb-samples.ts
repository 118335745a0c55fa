import { newId } from '../../lib/ids';
import { previewImport } from '../../lib/services/imports/preview-import';
import { getPumpTicket } from '../../lib/services/pump-tickets/get-pump-ticket';
import { getTicket } from '../../lib/services/tickets/get-ticket';
import { answerOf, type FullCompany, OTHER_BILL } from './full-company';
import { testPicture } from './pour';

type Sample = (of: FullCompany) => Record<string, unknown> | Promise<Record<string, unknown>>;

const load = ({ supplierId, jobId, placementId, draftOrder }: FullCompany, number: string) => ({
  number,
  supplierId,
  jobId,
  placementId,
  orderId: draftOrder.id,
  date: '2026-05-04',
  mixCode: '3000',
  quantityYd3: '8.00',
});
const versionOf = async ({ owner }: FullCompany, ticketId: string): Promise<number> =>
  (await answerOf(getTicket, owner, { ticketId })).version;

const pumpDay = ({ pumpSupplierId, jobId, placementId }: FullCompany, orderId: string) => ({
  supplierId: pumpSupplierId,
  jobId,
  placementId,
  orderId,
  date: '2026-05-04',
  pumpedYd3: '30.00',
});
const placement = {
  name: 'Walk',
  element: 'slab',
  subgrade: '',
  pourDate: '2026-05-06',
  firstTruckAt: null,
  figuredYd3: '12.00',
  areaFt2: null,
  thicknessIn: null,
  wastePercent: '5',
  notes: '',
};
const sheetOf = ({ open }: FullCompany) => ({ statementId: open.statementId });
const row = (of: FullCompany, index: 0 | 1 | 2) => ({
  ...sheetOf(of),
  rowKeys: [of.open.lineIds[index]],
});
const line = (of: FullCompany, index: 0 | 1 | 2) => ({
  ...sheetOf(of),
  billLineId: of.open.lineIds[index],
});
const filters = ({ supplierId, jobId, placementId }: FullCompany) => ({
  supplierId,
  jobId,
  placementId,
});

/**
 * A full input of every verb that takes ids, with the company's own: each must do what the verb is
 * for. All of the input's ids are filled in, the optional ones too.
 */
export const VERB_SAMPLES: Readonly<Record<string, Sample>> = {
  'activity.list': ({ owner, open }) => ({ actorId: owner.personId, entityId: open.statementId }),
  'imports.accept': async ({ owner, importId, tag }) => {
    const seen = await answerOf(previewImport, owner, { importId });
    return {
      importId,
      fileSha256: seen.preview.fileSha256,
      ...seen.proposed,
      number: `C-${tag}`,
    };
  },
  'imports.discard': ({ importId }) => ({ importId }),
  'imports.preview': ({ importId }) => ({ importId }),
  'imports.setLayout': ({ importId }) => ({ importId, layout: null }),
  'imports.upload': ({ supplierId }) => ({ supplierId, fileName: 'a.csv', bytes: OTHER_BILL }),
  'jobs.create': ({ crewPersonId }) => ({ number: 'N', name: 'New', crewIds: [crewPersonId] }),
  'jobs.get': ({ jobId }) => ({ jobId }),
  'jobs.update': ({ jobId, tag, crewPersonId }) => ({
    jobId,
    number: tag,
    name: `Barn ${tag}, again`,
    status: 'open',
    crewIds: [crewPersonId],
  }),
  'keys.revoke': ({ keyId }) => ({ keyId }),
  'orders.cancel': ({ sentOrderId }) => ({ orderId: sentOrderId, reason: 'rain' }),
  'orders.confirm': ({ sentOrderId }) => ({ orderId: sentOrderId, supplierReference: 'SC-1' }),
  'orders.create': ({ order }) => ({ clientId: newId(), ...order }),
  'orders.export': filters,
  'orders.get': ({ draftOrder }) => ({ orderId: draftOrder.id }),
  'orders.list': filters,
  'orders.send': ({ draftOrder }) => ({ orderId: draftOrder.id }),
  'orders.update': ({ draftOrder: { id, version }, order }) => ({
    orderId: id,
    version,
    ...order,
    notes: 'by the north gate',
  }),
  'outbox.get': ({ mailId }) => ({ mailId }),
  'people.changeRole': ({ crewPersonId }) => ({ personId: crewPersonId, role: 'bookkeeper' }),
  'people.remove': ({ crewPersonId }) => ({ personId: crewPersonId }),
  'people.withdrawInvitation': ({ invitationId }) => ({ invitationId }),
  'photos.get': ({ photoId }) => ({ photoId }),
  'photos.upload': async ({ placementId, toCheckId }) => ({
    placementId,
    clientId: newId(),
    ticketId: toCheckId,
    fileName: 'more.png',
    bytes: await testPicture(),
  }),
  'placements.create': ({ jobId }) => ({ jobId, ...placement }),
  'placements.get': ({ placementId }) => ({ placementId }),
  'placements.list': ({ jobId }) => ({ jobId }),
  'placements.update': ({ placementId }) => ({ placementId, ...placement, status: 'planned' }),
  'pourDay.placement': ({ placementId }) => ({ placementId }),
  'pumpTickets.create': (of) => ({
    clientId: newId(),
    number: 'T-new',
    ...pumpDay(of, of.pumpOrderId),
  }),
  'pumpTickets.get': ({ pumpTicketId }) => ({ pumpTicketId }),
  'pumpTickets.list': (of) => ({ ...filters(of), supplierId: of.pumpSupplierId }),
  'pumpTickets.update': async (of) => {
    const { pumpTicketId, owner, tag } = of;
    const { revision } = await answerOf(getPumpTicket, owner, { pumpTicketId });
    return { pumpTicketId, revision, number: `T-${tag}`, ...pumpDay(of, of.pumpOrderId) };
  },
  'rateSheets.approve': ({ draftSheetId }) => ({ rateSheetId: draftSheetId }),
  'rateSheets.create': ({ supplierId, jobId }) => ({
    supplierId,
    name: 'Next',
    jobId,
    effectiveFrom: '2028-01-01',
  }),
  'rateSheets.delete': ({ draftSheetId }) => ({ rateSheetId: draftSheetId }),
  'rateSheets.get': ({ draftSheetId }) => ({ rateSheetId: draftSheetId }),
  'rateSheets.update': ({ draftSheetId, jobId }) => ({
    rateSheetId: draftSheetId,
    name: 'Renamed',
    jobId,
    effectiveFrom: '2027-01-01',
    effectiveTo: null,
    clauses: [],
  }),
  'readings.get': ({ photoId }) => ({ photoId }),
  'statements.accept': (of) => ({ ...row(of, 1), reason: 'half a yard' }),
  'statements.candidates': (of) => line(of, 0),
  'statements.claim': (of) => row(of, 1),
  'statements.close': ({ settled }) => ({ statementId: settled.statementId }),
  'statements.export': ({ supplierId }) => ({ supplierId }),
  'statements.exportSheet': sheetOf,
  'statements.list': ({ supplierId }) => ({ supplierId }),
  'statements.matchByHand': (of) => ({
    ...line(of, 1),
    deliveries: [{ kind: 'ticket', id: of.ticketId }],
  }),
  'statements.refresh': sheetOf,
  'statements.reopen': ({ closed }) => ({ statementId: closed.statementId, reason: 'a slip' }),
  'statements.sheet': sheetOf,
  'statements.strike': (of) => row(of, 0),
  'statements.undo': sheetOf,
  'statements.unmatch': (of) => ({ ...line(of, 1), leaveTo: 'nothing' }),
  'statements.unstrike': (of) => row(of, 2),
  'suppliers.get': ({ supplierId }) => ({ supplierId }),
  'suppliers.update': ({ supplierId, tag }) => ({
    supplierId,
    name: `Slate Creek ${tag}`,
    kind: 'readyMix',
    dispatchEmail: '',
    creditEmail: '',
    phone: '',
    accountNumber: '12',
    archived: false,
  }),
  'tickets.attach': async (of) => ({
    ticketId: of.toCheckId,
    version: await versionOf(of, of.toCheckId),
    supplierId: of.supplierId,
    number: '7001',
  }),
  'tickets.choices': ({ jobId }) => ({ jobId }),
  'tickets.confirm': async (of) => ({
    ticketId: of.toCheckId,
    version: await versionOf(of, of.toCheckId),
    ...load(of, '7020'),
  }),
  'tickets.createByHand': (of) => ({ clientId: newId(), ...load(of, '7021') }),
  'tickets.export': filters,
  'tickets.get': ({ ticketId }) => ({ ticketId }),
  'tickets.list': filters,
  'tickets.reject': async (of) => ({
    ticketId: of.toCheckId,
    version: await versionOf(of, of.toCheckId),
    reason: 'not ours',
  }),
  'tickets.setClock': ({ ticketId }) => ({ ticketId, event: 'arrivedAt', at: 480 }),
  'tickets.update': async (of) => ({
    ticketId: of.ticketId,
    version: await versionOf(of, of.ticketId),
    ...load(of, '7001'),
    truck: '187',
  }),
  'variances.export': ({ supplierId, open }) => ({ supplierId, statementId: open.statementId }),
  'variances.list': ({ supplierId, open }) => ({ supplierId, statementId: open.statementId }),
  'yield.export': ({ jobId, supplierId }) => ({ jobId, supplierId }),
  'yield.list': ({ jobId, supplierId }) => ({ jobId, supplierId }),
};
