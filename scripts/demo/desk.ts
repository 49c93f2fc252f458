import { deliverPending } from "@/lib/mail/deliver-pending";
import type { DemoHouse } from "./demo-house";

/** Where the people of one product act. */
export interface Desk {
  house: DemoHouse;
  productCode: string;
  /** A key of its own for each form. */
  key: () => string;
  /** What an act told people was read long ago: it counts as sent then, and goes nowhere. */
  deliverMail: () => Promise<void>;
}

export function deskOf(house: DemoHouse, productCode: string): Desk {
  let forms = 0;
  return {
    house,
    productCode,
    key: () => `demo-${productCode}-${String((forms += 1)).padStart(4, "0")}`,
    deliverMail: async () => {
      const nowhere = { send: () => Promise.resolve(), clock: house.clock, baseUrl: "http://127.0.0.1" };
      await deliverPending(nowhere);
    },
  };
}
