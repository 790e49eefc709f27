/** A number of an earlier state of the film fades, but not for an answer that is there before the eye would see it. */
export const pendingLook = 'opacity-55 transition-opacity delay-100';
