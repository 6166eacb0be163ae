package org.wintersill.run;

import java.util.Optional;
import org.wintersill.climatology.WinterRecord;
import org.wintersill.engine.WinterPlanes;
import org.wintersill.season.DamageReckoning;
import org.wintersill.season.WinterValues;

/** The stored values of all winters in some rows, as the statistics take them. */
final class StoredWinters {
    private StoredWinters() {
    }

    /**
     * The winters of some rows.
     *
     * @param planes where they lie
     * @param cultivar empty for what belongs to no cultivar
     * @param firstCell number of the first cell in the grid
     */
    static WinterRecord record(RunPlan plan, WinterPlanes planes, Optional<Integer> cultivar, int row, int count, long firstCell) {
        int winters = plan.seasons().size();
        int levels = plan.job().levels();
        float[][] minimum = new float[winters][];
        float[][][] margins = new float[cultivar.isPresent() ? levels : 0][winters][];
        float[][] damage = new float[cultivar.isPresent() ? winters : 0][];
        for (int winter = 0; winter < winters; winter++) {
            if (cultivar.isEmpty()) {
                minimum[winter] = planes.read(WinterValues.minimumPlane(), winter, row, count);
                continue;
            }
            for (int level = 0; level < levels; level++) {
                margins[level][winter] = planes.read(WinterValues.marginPlane(cultivar.get(), level, levels), winter, row, count);
            }
            damage[winter] = planes.read(WinterValues.damagePlane(cultivar.get(), levels), winter, row, count);
        }
        return new WinterRecord(plan.choices().years(), cultivar.isPresent() ? new float[0][] : minimum, margins, damage,
                (cultivar.isPresent() ? damage : minimum)[0].length, firstCell,
                cultivar.map(number -> plan.cultivars().get(number).tolerance()), details(plan, planes, cultivar, row, count));
    }

    private static WinterRecord.Details details(RunPlan plan, WinterPlanes planes, Optional<Integer> cultivar, int row, int count) {
        DamageReckoning reckoning = plan.job().reckoning();
        int levels = plan.job().levels();
        int winters = plan.seasons().size();
        int cultivars = plan.cultivars().size();
        float[][] expected = new float[cultivar.isPresent() && reckoning.keepsExpected() ? winters : 0][];
        float[][][] damageAt = new float[cultivar.isPresent() && reckoning.phases() ? 2 : 0][winters][];
        for (int winter = 0; winter < expected.length; winter++) {
            expected[winter] = planes.read(WinterValues.expectedDamagePlane(cultivar.get(), cultivars, levels, reckoning), winter, row, count);
        }
        for (int end = 0; end < damageAt.length; end++) {
            int plane = WinterValues.damageAtPlane(cultivar.get(), end, cultivars, levels, reckoning);
            for (int winter = 0; winter < winters; winter++) {
                damageAt[end][winter] = planes.read(plane, winter, row, count);
            }
        }
        float[][][] cold = new float[cultivar.isEmpty() && reckoning.coldNight().isPresent() ? 2 : 0][winters][];
        for (int part = 0; part < cold.length; part++) {
            for (int winter = 0; winter < winters; winter++) {
                cold[part][winter] = planes.read(WinterValues.coldNightsPlane(cultivars, levels, reckoning) + part, winter, row, count);
            }
        }
        return new WinterRecord.Details(reckoning, plan.choices().levels(), expected, damageAt, cold);
    }
}
