"use client";

import { useRouter } from "next/navigation";
import { Panel } from "@/components/ui/panel";
import { showToast } from "@/components/ui/toasts";
import { EQUIPMENT } from "@/lib/engine/prescription/exercise";
import { useAddAthlete } from "@/lib/query/athletes";
import type { AthleteForm } from "@/lib/schemas/athlete";
import { ProfileForm } from "./profile-form";

/** Most gyms are free for lifting in daytime on weekdays and Saturday: a start that is quicker to correct than to type. */
const START: AthleteForm = {
  name: "",
  sport: "",
  dateOfBirth: null,
  trainingAge: "intermediate",
  strikingBase: "boxing",
  liftsPerWeek: 3,
  freeHours: [1, 2, 3, 4, 5, 6].map((weekday) => ({ weekday, from: "07:00", to: "21:00" })),
  secondBase: null,
  secondShare: null,
  limitations: "",
  limitationCodes: [],
  equipment: [...EQUIPMENT],
  plateUnit: "kg",
  plateStep: 2.5,
};

export function NewAthlete() {
  const router = useRouter();
  const add = useAddAthlete();
  return (
    <Panel className="max-w-3xl">
      <ProfileForm
        start={START}
        minor={false}
        act="Add the athlete"
        save={async (form) => {
          const { id } = await add.mutateAsync(form);
          showToast(`${form.name} is on the roster.`);
          router.push(`/athletes/${id}`);
        }}
      />
    </Panel>
  );
}
