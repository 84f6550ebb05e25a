/** Who may open the queue and its submissions; the server holds the same rule. */
export const reviewRoles = ['reviewer', 'curator'];
