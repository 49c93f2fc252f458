import { redirect } from "next/navigation";

export default function DaySheetPage() {
  redirect("/products");
}
