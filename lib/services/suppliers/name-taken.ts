import { type Failure, failure } from '../failure';

export function supplierNameTaken(name: string): Failure {
  return failure('conflict', `There is a supplier named ${name} already.`, [
    { path: 'name', message: 'already used' },
  ]);
}
