/// <reference types="astro/client" />
declare module '*?nodeworker' {
  const url: string;
  export default url;
}
// auth-astro's browser part names these types of a package that it does not bring.
declare module 'next-auth/react' {
  export type LiteralUnion<T extends string> = T | (string & Record<never, never>);
  export interface SignInOptions extends Record<string, unknown> {
    callbackUrl?: string;
    redirect?: boolean;
  }
  export type SignInAuthorizationParams = string | string[][] | Record<string, string> | URLSearchParams;
  export interface SignOutParams {
    callbackUrl?: string;
    redirect?: boolean;
  }
}
declare namespace App {
  interface Locals {
    /** the signed-in person as the database has them now, or null */
    user: {
      id: number;
      name: string;
      email: string;
      role: 'customer' | 'designer' | 'operator' | 'admin';
      confirmed: boolean;
    } | null;
    /** the session that the request's cookie names, or null */
    sessionId: string | null;
  }
}
