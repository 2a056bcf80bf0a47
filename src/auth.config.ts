import { SESSION_SECRET } from 'astro:env/server';
import { authConfig } from './lib/server/auth/auth-config';

export default authConfig(SESSION_SECRET);
