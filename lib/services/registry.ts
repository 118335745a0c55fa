import { changePassword } from './account/change-password';
import { endOtherSessions } from './account/end-other-sessions';
import { getAccount } from './account/get-account';
import { updateAccount } from './account/update-account';
import { listActivity } from './activity/list-activity';
import { getCompany } from './company/get-company';
import { updateCompany } from './company/update-company';
import { getDemoFile } from './demo/get-demo-file';
import { listDemoFiles } from './demo/list-demo-files';
import { acceptImport } from './imports/accept-import';
import { discardImport } from './imports/discard-import';
import { listImports } from './imports/list-imports';
import { previewImport } from './imports/preview-import';
import { setImportLayout } from './imports/set-import-layout';
import { uploadImport } from './imports/upload-import';
import { createJob } from './jobs/create-job';
import { getJob } from './jobs/get-job';
import { jobChoices } from './jobs/job-choices';
import { listJobs } from './jobs/list-jobs';
import { updateJob } from './jobs/update-job';
import { issueKey } from './keys/issue-key';
import { listKeys } from './keys/list-keys';
import { revokeKey } from './keys/revoke-key';
import { cancelOrder } from './orders/cancel-order';
import { confirmOrder } from './orders/confirm-order';
import { createOrder } from './orders/create-order';
import { exportOrders } from './orders/export-orders';
import { getOrder } from './orders/get-order';
import { listOrders } from './orders/list-orders';
import { sendOrder } from './orders/send-order';
import { updateOrder } from './orders/update-order';
import { getMail } from './outbox/get-mail';
import { listOutbox } from './outbox/list-outbox';
import { changeRole } from './people/change-role';
import { invitePerson } from './people/invite-person';
import { listPeople } from './people/list-people';
import { removePerson } from './people/remove-person';
import { withdrawInvitation } from './people/withdraw-invitation';
import { getPhoto } from './photos/get-photo';
import { getReading } from './photos/get-reading';
import { uploadPhoto } from './photos/upload-photo';
import { createPlacement } from './placements/create-placement';
import { getPlacement } from './placements/get-placement';
import { listPlacements } from './placements/list-placements';
import { updatePlacement } from './placements/update-placement';
import { getPourDay } from './pour-day/get-pour-day';
import { getPourDayPlacement } from './pour-day/get-pour-day-placement';
import { createPumpTicket } from './pump-tickets/create-pump-ticket';
import { getPumpTicket } from './pump-tickets/get-pump-ticket';
import { listPumpTickets } from './pump-tickets/list-pump-tickets';
import { updatePumpTicket } from './pump-tickets/update-pump-ticket';
import { approveRateSheet } from './rate-sheets/approve-rate-sheet';
import { createRateSheet } from './rate-sheets/create-rate-sheet';
import { deleteRateSheet } from './rate-sheets/delete-rate-sheet';
import { getRateSheet } from './rate-sheets/get-rate-sheet';
import { updateRateSheet } from './rate-sheets/update-rate-sheet';
import { acceptRows } from './statements/accept-rows';
import { claimRows } from './statements/claim-rows';
import { closeStatement } from './statements/close-statement';
import { exportSheet } from './statements/export-sheet';
import { exportStatements } from './statements/export-statements';
import { getSheet } from './statements/get-sheet';
import { listStatements } from './statements/list-statements';
import { matchByHand } from './statements/match-by-hand';
import { matchCandidates } from './statements/match-candidates';
import { refreshFindings } from './statements/refresh-findings';
import { reopenStatement } from './statements/reopen-statement';
import { strikeRows } from './statements/strike-rows';
import { undoLast } from './statements/undo';
import { unmatchLine } from './statements/unmatch-line';
import { unstrikeRows } from './statements/unstrike-rows';
import { createSupplier } from './suppliers/create-supplier';
import { exportSuppliers } from './suppliers/export-suppliers';
import { getSupplier } from './suppliers/get-supplier';
import { listSuppliers } from './suppliers/list-suppliers';
import { updateSupplier } from './suppliers/update-supplier';
import { attachTicket } from './tickets/attach-ticket';
import { confirmTicket } from './tickets/confirm-ticket';
import { createTicket } from './tickets/create-ticket';
import { exportTickets } from './tickets/export-tickets';
import { getTicket } from './tickets/get-ticket';
import { listTickets } from './tickets/list-tickets';
import { rejectTicket } from './tickets/reject-ticket';
import { setClock } from './tickets/set-clock';
import { ticketChoices } from './tickets/ticket-choices';
import { updateTicket } from './tickets/update-ticket';
import { exportVariances } from './variances/export-variances';
import { listVariances } from './variances/list-variances';
import type { Verb } from './verb';
import { exportYield } from './yield/export-yield';
import { listYield } from './yield/list-yield';

/** Every verb there is: the API's description and the generated tests go through this list. */
export const REGISTRY = [
  // One a line and grouped by noun, so that two additions do not meet in one line.
  changePassword,
  endOtherSessions,
  getAccount,
  updateAccount,
  listActivity,
  getCompany,
  updateCompany,
  createJob,
  jobChoices,
  getJob,
  listJobs,
  updateJob,
  issueKey,
  listKeys,
  revokeKey,
  getMail,
  listOutbox,
  changeRole,
  invitePerson,
  listPeople,
  removePerson,
  withdrawInvitation,
  uploadPhoto,
  getPhoto,
  getReading,
  getPourDay,
  getPourDayPlacement,
  listPumpTickets,
  getPumpTicket,
  createPumpTicket,
  updatePumpTicket,
  listTickets,
  exportTickets,
  ticketChoices,
  getTicket,
  createTicket,
  confirmTicket,
  updateTicket,
  rejectTicket,
  attachTicket,
  setClock,
  uploadImport,
  listImports,
  previewImport,
  setImportLayout,
  acceptImport,
  discardImport,
  listStatements,
  exportStatements,
  getSheet,
  exportSheet,
  refreshFindings,
  strikeRows,
  acceptRows,
  claimRows,
  unstrikeRows,
  undoLast,
  matchCandidates,
  matchByHand,
  unmatchLine,
  closeStatement,
  reopenStatement,
  listVariances,
  exportVariances,
  listDemoFiles,
  getDemoFile,
  listYield,
  exportYield,
  listPlacements,
  getPlacement,
  createPlacement,
  updatePlacement,
  listOrders,
  exportOrders,
  getOrder,
  createOrder,
  updateOrder,
  sendOrder,
  confirmOrder,
  cancelOrder,
  listSuppliers,
  exportSuppliers,
  getSupplier,
  createSupplier,
  updateSupplier,
  getRateSheet,
  createRateSheet,
  updateRateSheet,
  approveRateSheet,
  deleteRateSheet,
] as unknown as readonly Verb[];
