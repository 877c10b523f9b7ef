import { handleNextAuth } from '@/lib/access/next-auth';

/** Outside the wrapper: this is where people without a session come to get one. */
export const publicRoute = 'next-auth: csrf token, sign-in, sign-out, session';

export { handleNextAuth as GET, handleNextAuth as POST };
