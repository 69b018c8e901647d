package org.modestead.engine.modelfile;

import org.modestead.engine.operator.RankRule;

/** How a rank is chosen where the fit is repeated with other data. */
final class StoredRankRule {

    private static final int LARGEST = 1 << 24;

    private StoredRankRule() {}

    static Stored.Fields of(RankRule rule) {
        FieldsWriter out = new FieldsWriter();
        if (rule instanceof RankRule.Fixed fixed) {
            return out.text("kind", "fixed").whole("rank", fixed.rank()).done();
        }
        if (rule instanceof RankRule.Energy energy) {
            return out.text("kind", "energy").number("share", energy.share()).done();
        }
        if (rule instanceof RankRule.HardThreshold) {
            return out.text("kind", "hard-threshold").done();
        }
        if (rule instanceof RankRule.Holdout holdout) {
            return out.text("kind", "holdout").whole("largest", holdout.largest()).done();
        }
        RankRule.Drop drop = (RankRule.Drop) rule;
        return out.text("kind", "drop").whole("largest", drop.largest()).done();
    }

    static RankRule read(FieldsReader in) {
        String kind = in.text("kind");
        return switch (kind) {
            case "fixed" -> new RankRule.Fixed(in.count("rank", 1, LARGEST));
            case "energy" -> new RankRule.Energy(share(in));
            case "hard-threshold" -> new RankRule.HardThreshold();
            case "holdout" -> new RankRule.Holdout(in.count("largest", 1, LARGEST));
            case "drop" -> new RankRule.Drop(in.count("largest", 1, LARGEST));
            default -> throw in.wrong("kind", "the rank rule " + kind, "fixed, energy, hard-threshold, holdout or drop");
        };
    }

    private static double share(FieldsReader in) {
        double share = in.number("share");
        if (!(share > 0 && share <= 1)) {
            throw in.wrong("share", "the share " + share, "a share above 0 and at most 1");
        }
        return share;
    }
}
