import { redirect } from "next/navigation";

export default function AdministrationPage() {
  redirect("/administration/accounts");
}
