/** Sent with every request that changes something; a foreign page cannot set it without the server's leave. */
export const requestHeader = { name: 'x-brierbook-request', value: '1' } as const;
/** Where the endpoints live. */
export const apiRoot = '/api/v1';
