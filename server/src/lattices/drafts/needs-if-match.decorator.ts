import { ApiHeader } from '@nestjs/swagger';

/** Tells the API's reference that a route goes out from a version of the draft. */
export const NeedsIfMatch = (): MethodDecorator =>
  ApiHeader({
    name: 'if-match',
    required: true,
    description: 'ETag of the draft that was edited.',
  });
