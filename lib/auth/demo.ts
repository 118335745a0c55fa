/** Everyone in the demo company signs in with it; it guards invented records only. */
export const DEMO_PASSWORD = 'strike the slab';
