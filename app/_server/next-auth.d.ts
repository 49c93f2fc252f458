import "next-auth";
import "next-auth/jwt";

declare module "next-auth" {
  interface Session {
    userId: number;
    epoch: number;
  }

  interface User {
    epoch: number;
  }
}

declare module "next-auth/jwt" {
  interface JWT {
    userId?: number;
    epoch?: number;
  }
}
