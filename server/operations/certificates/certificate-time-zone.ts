/** Papers travel: they give their times in UTC and name it, wherever the site is. */
export const certificateTimeZone = 'UTC';
