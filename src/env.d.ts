/// <reference types="astro/client" />
declare module '*?nodeworker' {
  const url: string;
  export default url;
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
  }
}
