import { signIn } from '@/lib/services/sign-in';

const answer = (request: Request) => signIn().handler(request);

export { answer as GET, answer as POST };
