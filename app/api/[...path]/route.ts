import { answerUnknownAddress as answer } from '@/lib/http/unknown-address';

// For every address under /api that no other route takes: a program gets a problem it can read, not a page.
export { answer as GET, answer as POST, answer as PUT, answer as PATCH, answer as DELETE };
