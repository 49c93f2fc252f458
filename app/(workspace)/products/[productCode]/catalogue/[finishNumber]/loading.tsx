import { LoadingSheet } from "@/app/_components/loading-sheet";

export default function Loading() {
  return <LoadingSheet what="the sheet" />;
}
