/** A search text as a LIKE pattern that finds it anywhere: its own wildcards mean themselves. */
export const likePattern = (text: string) => `%${text.replace(/[\\%_]/g, '\\$&')}%`;
