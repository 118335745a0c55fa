import { routes } from '@/lib/routes';
import { company } from '@/lib/text/messages/en/company';

const NAMES: Readonly<Record<string, string>> = company.activity.entities;

/** What a kind of record is called; its own key where no name is written yet. */
export function entityName(entity: string): string {
  return NAMES[entity] ?? entity;
}

const PAGES: Readonly<Record<string, (id: string) => string>> = {
  company: () => routes.company(),
  person: () => routes.people(),
  invitation: () => routes.people(),
  accessKey: () => routes.accessKeys(),
  job: routes.job,
  placement: routes.placement,
  supplier: routes.supplier,
  rateSheet: routes.rateSheet,
  order: routes.order,
  ticket: routes.ticket,
  statement: routes.statement,
};

/** Where a record is looked at; null for kinds without a page of their own. */
export function entityPage(entity: string, id: string): string | null {
  return PAGES[entity]?.(id) ?? null;
}
