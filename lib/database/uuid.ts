/** Whether a text can be the id of a row; anything else would be an error of the database instead of a row that is not there. */
export const isUuid = (text: string): boolean => /^[\da-f]{8}(-[\da-f]{4}){3}-[\da-f]{12}$/i.test(text);
