package org.wintersill.hardiness;
public record LethalTemperatures(double[] lt10, double[] lt50, double[] lt90) { }
