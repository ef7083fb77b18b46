import { applyDecorators, SerializeOptions } from '@nestjs/common';
import { ApiResponse } from '@nestjs/swagger';
import { z } from 'zod';

type ResponseSchema = Extract<Parameters<typeof ApiResponse>[0], { schema: unknown }>['schema'];

/**
 * What a route answers: only the contract's declared fields go out, and the API page shows them.
 *
 * @param schema the contract
 * @param status the status it is answered with
 */
export function Returns(schema: z.ZodType, status = 200): MethodDecorator & ClassDecorator {
  const described = z.toJSONSchema(schema, { io: 'output', unrepresentable: 'any', target: 'openapi-3.0' });
  // Nest puts each element of a list through the schema, not the list as a whole.
  const serialised = schema instanceof z.ZodArray ? (schema.element as z.ZodType) : schema;
  return applyDecorators(
    SerializeOptions({ schema: serialised }),
    ApiResponse({ status, schema: described as ResponseSchema }),
  );
}
