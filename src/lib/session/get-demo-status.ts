import { queryOptions } from '@tanstack/react-query';
import { call } from '../api/call.ts';
import { keys } from '../api/keys.ts';
import { routes } from '../api/routes.ts';

/** Whether the fakes of the demo run: they do, or do not, for as long as the server lives. */
export const demoStatusQuery = queryOptions({ queryKey: keys.demoStatus(), queryFn: ({ signal }) => call(routes.demo.status, { signal }), staleTime: Infinity });
