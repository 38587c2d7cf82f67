/** Header that carries the client's address to the routes. Whatever a client sends under this name is dropped. */
export const addressHeader = 'x-fascicle-address';
