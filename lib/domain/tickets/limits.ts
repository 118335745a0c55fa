/** No truck on a road carries more: a larger number is a slip of the reader or of a finger. */
export const MAX_LOAD_YD3 = 30;
