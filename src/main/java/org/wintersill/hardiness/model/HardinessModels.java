package org.wintersill.hardiness.model;

import java.util.List;
import java.util.Optional;
import java.util.function.Function;
import org.wintersill.hardiness.HardinessModel;
import org.wintersill.hardiness.ModelParameters;

/** The models of this program: one line each. A new model is one class and one line here. */
public final class HardinessModels {
    private static final List<Entry> ALL = List.of(
            new Entry("dated", DatedCurveReader::read),
            new Entry("response", ResponseModel::read),
            new Entry("thermal-time", ThermalTimeReader::read),
            new Entry("relaxation", RelaxationModel::read),
            new Entry("stage", StageReader::read));

    /**
     * A model by its word in a cultivar file.
     *
     * @param read makes the model from the parameters of an entry; empty after problems, which it has reported
     */
    private record Entry(String word, Function<ModelParameters, Optional<HardinessModel>> read) {
    }

    private HardinessModels() {
    }

    /** Words of the cultivar file. */
    public static List<String> words() {
        return ALL.stream().map(Entry::word).toList();
    }

    /** The model of a word with the parameters of an entry; empty after problems, which are reported there. */
    public static Optional<HardinessModel> read(String word, ModelParameters parameters) {
        return ALL.stream().filter(entry -> entry.word().equals(word)).findFirst().orElseThrow().read().apply(parameters);
    }
}
