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
] as unknown as readonly Verb[];
