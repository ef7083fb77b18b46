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
  return applyDecorators(
    SerializeOptions({ schema }),
    ApiResponse({ status, schema: described as ResponseSchema }),
  );
}
