package org.wintersill.hardiness;

import java.io.Serializable;
import java.util.List;

/**
 * The cultivars or provenances that a species value stands for, as offsets of their lethal temperatures from it. The offset of a
 * variant is added to LT10, LT50 and LT90 alike and holds all winter: negative is hardier.
 *
 * @param sd standard deviation of the offsets, K; 0 for none. Of a list it is that of its members, divided by their number
 *     (science 16.8)
 * @param members named variants in the order of the file; empty where only the spread is known
 */
public record Variants(double sd, List<Variant> members) implements Serializable {

    /**
     * One cultivar or provenance.
     *
     * @param id has the form of a cultivar id
     * @param offset lethal temperatures of the variant minus those of the species, K
     */
    public record Variant(String id, double offset) implements Serializable {
    }

    public Variants {
        members = List.copyOf(members);
        if (!(sd >= 0) || Double.isInfinite(sd)) {
            throw new IllegalArgumentException("not a standard deviation: " + sd);
        }
    }

    /** No variation within the cultivar. */
    public static Variants none() {
        return new Variants(0, List.of());
    }

    /** Normally distributed offsets around zero. */
    public static Variants ofSd(double sd) {
        return new Variants(sd, List.of());
    }

    /** The listed variants, each counting the same. */
    public static Variants of(List<Variant> members) {
        double mean = members.stream().mapToDouble(Variant::offset).sum() / members.size();
        double squares = members.stream().mapToDouble(member -> (member.offset() - mean) * (member.offset() - mean)).sum();
        return new Variants(Math.sqrt(squares / members.size()), members);
    }

    public boolean isNone() {
        return sd == 0 && members.isEmpty();
    }
}
