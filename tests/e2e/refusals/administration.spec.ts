import { callAction } from "../support/http-action";
import { HTTP_PASSWORD, PRODUCT } from "../support/http-people";
import { test } from "../support/http-test";

const ADMINISTRATOR = "Only an administrator of the installation";

test("who is no administrator makes no product and no account, and gives nobody a role", async ({ as, refuses }) => {
  for (const name of ["lusia", "tansy", "maud"] as const) {
    const person = await as(name);
    const product = { code: "HT-9", name: "A new product", kind: "duct", timeZone: "UTC" };
    const createProduct = { name: "createProductAction", page: "/administration/products" };
    await refuses(() => callAction(person, createProduct, product), {
      code: "forbidden",
      sentence: `${ADMINISTRATOR} may create a product.`,
      recorded: { act: "create_product", by: person },
    });
    const account = { email: "friend@example.org", name: "A friend", password: HTTP_PASSWORD, isAdministrator: true };
    const createAccount = { name: "createAccountAction", page: "/administration/accounts" };
    await refuses(() => callAction(person, createAccount, account), {
      code: "forbidden",
      sentence: `${ADMINISTRATOR} may create an account.`,
      recorded: { act: "create_account", by: person },
    });
    const role = { productCode: PRODUCT, userId: person.userId, role: "reviewer", reason: "" };
    const giveRole = { name: "giveRoleAction", page: "/administration/roles" };
    await refuses(() => callAction(person, giveRole, role), {
      code: "forbidden",
      sentence: `${ADMINISTRATOR} may give a role.`,
      recorded: { act: "give_role", by: person },
    });
  }
});
