/** Decisions offered where an authority has not told its own words. */
export const usualDecisions = ['Approved', 'Approved as Noted', 'Revise and Resubmit'];
