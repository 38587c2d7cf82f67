import { openapiDocument } from '@/lib/contracts/http/openapi-document';

/** The description of this interface, for whoever makes a client of it. It holds nothing of any hospital. */
export function GET(): Response {
  return Response.json(openapiDocument());
}
