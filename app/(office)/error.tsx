'use client';

/* Here as well as at the root, so that a broken page keeps the tabs above it. */
export { default } from '../error';
