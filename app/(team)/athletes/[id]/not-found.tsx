import { MessagePage } from "@/components/shell/message-page";
import { LinkButton } from "@/components/ui/link-button";

export default function AthleteNotFound() {
  return (
    <MessagePage
      title="There is no such athlete"
      actions={
        <LinkButton href="/board" variant="primary">
          To the first page
        </LinkButton>
      }
    >
      <p>The profile may have been removed, or it is not one that you can see.</p>
    </MessagePage>
  );
}
