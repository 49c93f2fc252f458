/** Where the count of what waits is read: whoever acts has it read anew. */
export const WAITING_ADDRESS = "/api/waiting";
