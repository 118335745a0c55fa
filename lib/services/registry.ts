import { changePassword } from './account/change-password';
import { endOtherSessions } from './account/end-other-sessions';
import { getAccount } from './account/get-account';
import { updateAccount } from './account/update-account';
import { listActivity } from './activity/list-activity';
import { getCompany } from './company/get-company';
import { updateCompany } from './company/update-company';
import { createJob } from './jobs/create-job';
import { getJob } from './jobs/get-job';
import { listJobs } from './jobs/list-jobs';
import { updateJob } from './jobs/update-job';
import { issueKey } from './keys/issue-key';
import { listKeys } from './keys/list-keys';
import { revokeKey } from './keys/revoke-key';
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
import { getPourDay } from './pour-day/get-pour-day';
import { getPourDayPlacement } from './pour-day/get-pour-day-placement';
import { createPumpTicket } from './pump-tickets/create-pump-ticket';
import { getPumpTicket } from './pump-tickets/get-pump-ticket';
import { listPumpTickets } from './pump-tickets/list-pump-tickets';
import { updatePumpTicket } from './pump-tickets/update-pump-ticket';
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
import type { Verb } from './verb';

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
] as unknown as readonly Verb[];
