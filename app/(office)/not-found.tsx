/* Here as well as at the root, so that the tabs stay above it. */
export { default } from '../not-found';
