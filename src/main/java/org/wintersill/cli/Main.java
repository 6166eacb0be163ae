package org.wintersill.cli;
public final class Main { public static void main(String[] a) { } }
