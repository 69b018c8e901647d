package org.modestead.engine.modelfile;

import java.util.Optional;
import org.modestead.engine.basis.FunctionBasis;
import org.modestead.engine.moments.Conditioner;
import org.modestead.engine.moments.Features;
import org.modestead.engine.moments.Pilot;
import org.modestead.engine.moments.StreamPlan;

/** What was known before snapshot pairs were summed up. */
public final class StoredPilot {

    private StoredPilot() {}

    /** Returns the tree of a pilot. */
    public static Stored.Fields of(StreamPlan plan, Pilot pilot) {
        Optional<FunctionBasis> basis = Optional.of(pilot.basis()).filter(functions -> !(plan.features() instanceof Features.Coordinates));
        return new FieldsWriter().number("step", pilot.step()).put("preparation", StoredSnapshots.of(pilot.preparation()))
                .put("basis", basis, StoredBasis::of).matrix("map", pilot.conditioner().map()).matrix("back", pilot.conditioner().back()).done();
    }

    /** Returns the pilot of a tree. */
    public static Pilot read(FieldsReader in, StreamPlan plan) {
        FunctionBasis basis = in.optional("basis", own -> StoredBasis.read(own, plan.stateSize())).orElseGet(() -> Pilot.coordinates(plan));
        int size = basis.size();
        return new Pilot(in.number("step"), in.object("preparation", own -> StoredSnapshots.readPreparation(own, plan.channels().size())), basis,
                new Conditioner(in.matrix("map", size, size), in.matrix("back", size, size)));
    }
}
