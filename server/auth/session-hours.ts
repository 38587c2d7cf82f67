/** A session outlasts the longest case with its preparation. House rule. */
export const sessionHours = 16;
